/** What a broken record means and what to do, for whoever looks after it; `broken` counts from 0. */
export function sayBreak(broken: number, entries: number): string {
  const what =
    broken >= entries
      ? `The last of its ${entries} entries is not the one that was written last: entries at its end are missing.`
      : `Entry ${broken + 1} of ${entries} does not follow from the one before it: it was changed, or one before it was taken out.`;
  return `${what} This cannot be done with the program. Keep the database as it is, compare it with a copy made earlier, and find out who had access to it.`;
}
