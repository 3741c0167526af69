/** Relations at which a formula may be broken; the relation opens the next line. */
const RELATION =
  /^(=|<|>|\\(?:le|ge|leq|geq|ne|neq|approx|equiv|to|rightarrow|Rightarrow|lt|gt)(?![a-zA-Z]))/;
const TOKEN = /\\(?:begin|end)\s*\{[^}]*\}|\\[a-zA-Z]+|\\.|[^\\]/gsu;

/**
 * Cuts TeX before each relation that stands at its top level: not in braces, brackets of \left … \right, parentheses
 * or an environment. The pieces joined are the formula again.
 */
export function splitAtRelations(tex: string): string[] {
  const pieces = [''];
  let depth = 0;
  let at = 0;
  for (const [token] of tex.matchAll(TOKEN)) {
    const opens = /^(?:\{|\(|\[|\\left$|\\begin)/.test(token);
    const closes = /^(?:\}|\)|\]|\\right$|\\end)/.test(token);
    if (closes) depth -= 1;
    const current = pieces.length - 1;
    if (depth === 0 && RELATION.test(tex.slice(at)) && pieces[current]?.trim() !== '') pieces.push(token);
    else pieces[current] += token;
    if (opens) depth += 1;
    at += token.length;
  }
  return pieces;
}
