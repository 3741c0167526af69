// server only
import { type Zippable, zipSync } from 'fflate';

/** Files as one ZIP archive (PKWARE APPNOTE 6.3); a PDF is stored as it is, everything else is deflated. */
export function zipOf(files: readonly { path: string; bytes: Uint8Array }[]): Uint8Array {
  const entries: Zippable = {};
  for (const { path, bytes } of files) {
    if (path in entries) throw new Error(`two files named ${path}`);
    entries[path] = [bytes, { level: path.endsWith('.pdf') ? 0 : 6 }];
  }
  return zipSync(entries);
}
