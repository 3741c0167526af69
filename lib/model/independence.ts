/** A category of independence of a check, with what the record can hold it to. */
export interface Category {
  category: 0 | 1 | 2 | 3;
  name: string;
  /** Who may check, in one sentence. */
  rule: string;
}

/** Where the four categories come from, as it is printed. */
export const categorySource = 'BS 5975-1:2024, categories 0 to 3';

/**
 * Categories of independence as in BS 5975-1:2024 (and CG 300). That nobody checks what they wrote themselves is asked in
 * every category, after UFC 3-260-11FA.
 */
export const categories: readonly Category[] = [
  {
    category: 0,
    name: 'standard solution',
    rule: 'Someone who did not write in the sheet holds it against a standard solution, which is named.',
  },
  {
    category: 1,
    name: 'another member of the team',
    rule: 'Someone of the office who did not write in the sheet.',
  },
  {
    category: 2,
    name: 'not involved and not consulted',
    rule: 'Someone who wrote in no sheet of the job, has no other part in it, and declares not to have been consulted.',
  },
  {
    category: 3,
    name: 'another organisation',
    rule: 'Someone of another organisation with no part in the job, who declares not to have been consulted.',
  },
];

/** "category 2, not involved and not consulted". */
export function categoryWords(category: number): string {
  const found = categories.find((c) => c.category === category);
  return found ? `category ${category}, ${found.name}` : `category ${category}`;
}

/** What the checker declares when a check of category 2 or 3 is concluded. */
export const declarationWords =
  'I was neither involved in nor consulted on this calculation, and worked without the designer’s help other than by queries in the schedule.';

export const needsDeclaration = (category: number): boolean => category >= 2;
