import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** When a process began, in ticks since the machine did; with its number it names a process for good. */
function beginOf(pid) {
  try {
    return readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ').at(-1).split(' ')[19];
  } catch {
    return undefined;
  }
}

/** Writes down a process that this start depends on, so that the next start can end it if this one is killed. */
export function remember(folder, name, pid, facts = {}) {
  const place = join(folder, 'processes');
  mkdirSync(place, { recursive: true });
  const file = join(place, name);
  writeFileSync(file, JSON.stringify({ pid, begin: beginOf(pid), ...facts }));
  return () => rmSync(file, { force: true });
}

/** What was written down of a process, if it still runs. */
export function running(folder, name) {
  const file = join(folder, 'processes', name);
  if (!existsSync(file)) return undefined;
  const noted = JSON.parse(readFileSync(file, 'utf8'));
  return noted.begin !== undefined && beginOf(noted.pid) === noted.begin ? noted : undefined;
}

/** Ends what an earlier start that was killed has left running; `own` is the name under which this one is noted. */
export async function endLeftOver(folder, own) {
  const place = join(folder, 'processes');
  if (!existsSync(place)) return;
  for (const name of readdirSync(place).filter((n) => n !== own)) {
    const left = running(folder, name);
    if (left) process.kill(left.pid, 'SIGTERM');
    for (let i = 0; i < 150 && running(folder, name); i++) await new Promise((r) => setTimeout(r, 100));
    rmSync(join(place, name), { force: true });
  }
}
