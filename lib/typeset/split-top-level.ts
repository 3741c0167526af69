/** What a formula may be broken before; the sign opens the next line. */
const BREAKS = {
  relations:
    /^(=|<|>|\{=\}|\\(?:le|ge|leq|geq|ne|neq|approx|equiv|to|rightarrow|Rightarrow|lt|gt)(?![a-zA-Z]))/,
  terms: /^(\+|-|−|\\(?:pm|mp|times|cdot)(?![a-zA-Z]))/,
};
const TOKEN = /\\(?:begin|end)\s*\{[^}]*\}|\{=\}|\\[a-zA-Z]+|\\.|[^\\]/gsu;
/** After these a sign belongs to what follows it and is no place to break. */
const OPENING = /(?:^|[=<>+\-−(,]|\{=\}|\\;|\\mathopen\{\}|\\times|\\cdot)\s*$/;

/**
 * Cuts TeX before each relation, or before each term and factor, that stands at its top level: not in braces, brackets
 * of \left … \right, parentheses or an environment. The pieces joined are the formula again.
 */
export function splitTopLevel(tex: string, at: keyof typeof BREAKS): string[] {
  const pieces = [''];
  let depth = 0;
  let place = 0;
  for (const [token] of tex.matchAll(TOKEN)) {
    if (/^(?:\}|\)|\]|\\right$|\\end)/.test(token)) depth -= 1;
    const current = pieces.at(-1) ?? '';
    const breaks = depth === 0 && BREAKS[at].test(tex.slice(place));
    if (breaks && current.trim() !== '' && (at === 'relations' || !OPENING.test(current))) pieces.push(token);
    else pieces[pieces.length - 1] = current + token;
    if (/^(?:\{(?!=\})|\(|\[|\\left$|\\begin)/.test(token)) depth += 1;
    place += token.length;
  }
  return pieces;
}
