/** A person's part in a sheet: initials and the day, as "2026-11-16". */
export type SignOff = { readonly initials: string; readonly date: string };

/** How the printed file stands: what may be done with it is said on every page. */
export type PaperMode = 'preliminary' | 'review' | 'final';

export const MODE_WORDS: Readonly<Record<PaperMode, string | undefined>> = {
  preliminary: 'preliminary, not for construction',
  review: 'review copy, unsigned',
  final: undefined,
};

/** What the foot line says, from left to right. */
export type Imprint = {
  readonly office: string;
  readonly job: string;
  /** "rev 2" of a sheet, "submittal 2" of a package. */
  readonly issue?: string;
  readonly originator?: SignOff;
  readonly checker?: SignOff;
  readonly mode: PaperMode;
  /** First digits of the digest of the revision or package, "5e1f 90c7". */
  readonly digest?: string;
};

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** "2026-11-16" as "16 Nov 2026". Throws a RangeError on anything else. */
export function writeDate(date: string): string {
  const [, year, month, day] = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date) ?? [];
  const name = MONTHS[Number(month) - 1];
  if (!name) throw new RangeError(`A date on paper is written YYYY-MM-DD, not "${date}".`);
  return `${Number(day)} ${name} ${year}`;
}

/** The pieces of the foot line after the office's name. */
export function imprintWords({ job, issue, originator, checker, mode, digest }: Imprint): string[] {
  const signed = (role: string, by: SignOff | undefined) =>
    by && `${role} ${by.initials} ${writeDate(by.date)}`;
  return [
    job,
    issue,
    signed('originator', originator),
    signed('checker', checker),
    MODE_WORDS[mode],
    digest,
  ].filter((piece) => piece !== undefined);
}
