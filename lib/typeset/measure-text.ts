import type { FaceName } from '@/lib/typeset/face';
import type { Typesetter } from '@/lib/typeset/typesetter';

/** Width of words in points, kerning included. */
export function measureText(text: string, face: FaceName, size: number, typesetter: Typesetter): number {
  return typesetter.text(text, face).width * size;
}
