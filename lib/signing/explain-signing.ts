// server only
import type { PdfChangeKind } from './pdf-change';
import { changedKeys, isName, PdfDict, PdfRef, PdfStream, type PdfValue } from './pdf-value';
import { readSignatureFields, type SignatureField } from './read-signature-fields';
import type { Update } from './read-update';

export interface SigningExplained {
  readonly field?: SignatureField;
  /** Objects the filling of the field accounts for. */
  readonly accounted: ReadonlySet<string>;
  readonly wrong: readonly PdfChangeKind[];
}

/** A form XObject that can only draw: no resources, so no fonts, pictures or further forms, and no group or layer. */
const plainKeys = new Set(['Type', 'Subtype', 'BBox', 'Matrix', 'Resources', 'Length', 'Filter', 'FormType']);

function isPlainDrawing(value: PdfValue | undefined): boolean {
  if (!(value instanceof PdfStream) || !isName(value.dict.get('Subtype'), 'Form')) return false;
  const resources = value.dict.get('Resources');
  const empty = resources === undefined || (resources instanceof PdfDict && resources.entries.size === 0);
  return empty && [...value.dict.entries.keys()].every((key) => plainKeys.has(key));
}

/** The fresh form a filled field is drawn with, if its appearance is nothing but that. */
function freshDrawing(appearance: PdfValue | undefined, { after, fresh }: Update): PdfRef | undefined {
  if (!(appearance instanceof PdfDict) || appearance.entries.size !== 1) return undefined;
  const form = appearance.get('N');
  if (!(form instanceof PdfRef) || !fresh.has(form.key)) return undefined;
  return isPlainDrawing(after.object(form)?.value) ? form : undefined;
}

/** Finds the field an update signs, and what of the update that alone explains. */
export function explainSigning(update: Update): SigningExplained {
  const before = new Map(readSignatureFields(update.before).map((field) => [field.ref.key, field]));
  const fields = readSignatureFields(update.after);
  const accounted = new Set<string>();
  const wrong: PdfChangeKind[] = [];
  const signed = fields.filter(({ ref, signed }) => signed && !before.get(ref.key)?.signed);
  const [field] = signed;
  if (signed.length > 1 || fields.length !== before.size) wrong.push('field');
  if (!field) return { accounted, wrong };
  const old = before.get(field.ref.key);
  const value = field.dict.get('V');
  if (!old || !(value instanceof PdfRef) || !update.fresh.has(value.key))
    return { field, accounted, wrong: ['field'] };
  accounted.add(field.ref.key).add(value.key);
  const keys = changedKeys(old.dict, field.dict);
  if (!keys.every((key) => key === 'V' || key === 'AP')) wrong.push('field');
  if (keys.includes('AP')) {
    const drawing = freshDrawing(field.dict.get('AP'), update);
    if (drawing) accounted.add(drawing.key);
    else wrong.push('seal-appearance');
  }
  return { field, accounted, wrong };
}
