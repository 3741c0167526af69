const escapes: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const plain = (text: string) => text.replace(/[&<>"]/g, (c) => escapes[c] as string);

export interface IndexSection {
  title: string;
  files: { path: string; words: string }[];
}

/** A page that opens without the product and leads to every file beside it. */
export function indexPage(
  title: string,
  facts: readonly string[],
  sections: readonly IndexSection[],
): string {
  const list = (section: IndexSection) =>
    `<h2>${plain(section.title)}</h2>\n<ul>\n${section.files
      .map((f) => `<li><a href="${encodeURI(f.path)}">${plain(f.path)}</a> ${plain(f.words)}</li>`)
      .join('\n')}\n</ul>`;
  return `<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<title>${plain(title)}</title>
<style>body{font:16px/1.5 sans-serif;max-width:46em;margin:2em auto;padding:0 1em}small{color:#555}</style>
<h1>${plain(title)}</h1>
<p>${facts.map(plain).join('<br>')}</p>
${sections
  .filter((s) => s.files.length > 0)
  .map(list)
  .join('\n')}
</html>
`;
}
