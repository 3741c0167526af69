import { accuracy } from './accuracy';
import { growth } from './growth';
import { singularity } from './scales';
import { refusals, speed } from './speed';
import { print } from './table';

/** Numbers of the engine side by side, measured in one run on one machine. The targets stand beside them. */
const seed = 20_261;

print(`Node ${process.version}, seed ${seed}`);
print();
speed();
refusals();
accuracy(seed);
growth();
singularity();
