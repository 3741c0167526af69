import type { NotWritten } from '@/lib/engine/derivation/not-written';

/** Why a part of the calculation is given by its results alone, as a sentence. */
export function notWrittenWords(reason: NotWritten): string {
  switch (reason.why) {
    case 'cells':
      return `**Not written out.** With ${reason.redundants} redundants (more than ${reason.upTo}) the unit states of this structure reach across most of it, and their tables would be longer than anyone could follow. The equations were set for self-stress states around single cells of the structure instead. What stands for this step are the redundants of step 10, the forces of step 11 and the checks of step 15.`;
    case 'size':
      return `**Not written line by line.** With ${reason.redundants} redundants and ${reason.members} members the lines would run over many pages. The tables give what they come to; every joint is held to equilibrium in step 15.`;
    case 'alike':
      return 'The same way; its forces are in the tables.';
    case 'order':
      return '**Not written line by line.** Its forces follow from no order of equations with a few unknowns at a time. The tables give them; every joint is held to equilibrium in step 15.';
    case 'couple':
      return '**Not written line by line.** A load has a couple for its resultant or stands on a member that is cut, which the lines do not write. The tables give the forces; every joint is held to equilibrium in step 15.';
  }
}
