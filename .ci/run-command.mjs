import { spawn, spawnSync } from 'node:child_process';

// mariadbd lies in /usr/sbin, which is not on everybody's path.
process.env.PATH = `${process.env.PATH}:/usr/sbin`;

/** Runs a command to its end and shows what it prints; throws a plain sentence when it fails. */
export function run(command, args, options = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { stdio: 'inherit', ...options });
    child.on('error', (error) => reject(new Error(`${command} could not be started: ${error.message}`)));
    child.on('exit', (code, signal) =>
      code === 0 ? resolve() : reject(new Error(`${command} ${args.join(' ')} ended with ${code ?? signal}`)),
    );
  });
}

/** Whether a program is on the path. */
export function has(program) {
  return spawnSync('sh', ['-c', `command -v ${program}`]).status === 0;
}
