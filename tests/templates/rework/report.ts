/** What re-working a document found. */
export interface Report {
  /** Substitutions worked with the printed figures, formulas worked at full precision, cells and totals worked again. */
  counts: {
    substitutions: number;
    formulas: number;
    relations: number;
    cells: number;
    held: number;
    chains: number;
  };
  worst: { substitution: number; formula: number; cell: number };
  failures: string[];
  /** Definitions and statements in symbols alone, which give no number. */
  statements: string[];
  unparsed: string[];
}

/** Tolerances in units of the last figure: a substitution, a formula at full precision, a cell. */
export const tolerances = { substitution: 1, formula: 0.5, cell: 1 } as const;
/** What binary arithmetic adds to a half. */
export const slack = 1e-6;

/** Holds a worked value against a printed one. */
export function compare(
  worked: number,
  shown: number,
  lastUnit: number,
  kind: 'substitution' | 'formula' | 'cell',
  report: Report,
  failed: (why: string) => void,
): void {
  const error = Math.abs(worked - shown) / lastUnit;
  report.worst[kind] = Math.max(report.worst[kind], error);
  if (!(error <= tolerances[kind] + slack))
    failed(`${kind} gives ${worked}, printed ${shown}: ${error.toFixed(2)} units of the last figure`);
}
