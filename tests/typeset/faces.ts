import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { type FaceName, openFaces } from '@/lib/typeset/face';

const root = fileURLToPath(new URL('../..', import.meta.url));

/** The faces of screen and paper, from the same files as both. */
export const faces = openFaces((name: FaceName) =>
  readFileSync(
    name.startsWith('Inter-')
      ? `${root}/fonts/${name.toLowerCase()}.ttf`
      : `${root}/node_modules/katex/dist/fonts/${name}.ttf`,
  ),
);
