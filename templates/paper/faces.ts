// server only
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { openFaces } from '@/lib/typeset/face';
import { createTypesetter } from '@/lib/typeset/typesetter';

/** The faces of the printed page, read from the project's own files at first use. */
const faces = openFaces((name) => {
  const file = name.startsWith('Inter-')
    ? path.join(process.cwd(), 'fonts', `${name.toLowerCase()}.ttf`)
    : path.join(process.cwd(), 'node_modules', 'katex', 'dist', 'fonts', `${name}.ttf`);
  return readFileSync(file);
});

/** One typesetter for the life of the server: what one sheet has set, the next one finds. */
export const typesetter = createTypesetter(faces);
