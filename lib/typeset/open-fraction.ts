import { splitTopLevel } from './split-top-level';

/**
 * A member that is one fraction, `=\frac{a+b}{c}`, as parts that may stand on lines of their own:
 * `=\tfrac{1}{c}\,[a`, `+b]`. Undefined when it is anything else, or its numerator is one term.
 */
export function openFraction(tex: string): string[] | undefined {
  const at = tex.indexOf('\\frac{');
  if (at === -1) return undefined;
  const numerator = braced(tex, at + 5);
  const denominator = numerator && braced(tex, numerator.end);
  if (!numerator || !denominator || denominator.end !== tex.length) return undefined;
  const parts = splitTopLevel(numerator.inside, 'terms');
  if (parts.length < 2) return undefined;
  const opened = `${tex.slice(0, at)}\\tfrac{1}{${denominator.inside}}\\,[${parts[0]}`;
  return [opened, ...parts.slice(1, -1), `${parts.at(-1)}]`];
}

/** What stands in the braces that open at `from`, and the place after them. */
function braced(tex: string, from: number): { inside: string; end: number } | undefined {
  if (tex[from] !== '{') return undefined;
  let depth = 0;
  for (let i = from; i < tex.length; i++) {
    if (tex[i] === '\\') i++;
    else if (tex[i] === '{') depth++;
    else if (tex[i] === '}' && --depth === 0) return { inside: tex.slice(from + 1, i), end: i + 1 };
  }
  return undefined;
}
