import { create, type MathNode, parseDependencies } from 'mathjs/number';

const { parse } = create(parseDependencies ?? {});

const vulgar: Record<string, string> = {
  '½': ' 1/2',
  '¼': ' 1/4',
  '¾': ' 3/4',
  '⅛': ' 1/8',
  '⅜': ' 3/8',
  '⅝': ' 5/8',
  '⅞': ' 7/8',
};

/**
 * Feet and inches as they are written on drawings (12'-6", 12' 6 1/2", 6'', 12 ft 6 in) become sums that arithmetic
 * understands; ×, ·, −, ² and typographic quotes become their plain forms.
 */
export function plainExpression(text: string): string {
  return text
    .trim()
    .replace(/[½¼¾⅛⅜⅝⅞]/g, (c) => vulgar[c] ?? c)
    .replace(/[×·⋅]/g, '*')
    .replace(/[−–]/g, '-')
    .replace(/²/g, '^2')
    .replace(/³/g, '^3')
    .replace(/⁴/g, '^4')
    .replace(/[′’]/g, "'")
    .replace(/[″”]|''/g, '"')
    .replace(/°\s*([CF])/g, 'deg$1')
    .replace(/°/g, ' deg')
    .replace(/(\d),(?=\d{3}(?!\d))/g, '$1')
    .replace(
      /(\d+(?:\.\d+)?)\s*(?:'|ft\b)\s*-?\s*(\d+)[\s-]+(\d+)\s*\/\s*(\d+)\s*(?:"|in\b)/g,
      '($1 ft + ($2 + $3/$4) in)',
    )
    .replace(
      /(\d+(?:\.\d+)?)\s*(?:'|ft\b)\s*-?\s*(\d+(?:\.\d+)?(?:\s*\/\s*\d+)?)\s*(?:"|in\b)/g,
      '($1 ft + ($2) in)',
    )
    .replace(/(\d+)[\s-]+(\d+)\s*\/\s*(\d+)\s*(?:"|in\b)/g, '(($1 + $2/$3) in)')
    .replace(/(\d+(?:\.\d+)?)\s*'/g, '($1 ft)')
    .replace(/(\d+(?:\.\d+)?)\s*"/g, '($1 in)')
    .replace(/\bin\b/g, 'inch');
}

/** The arithmetic of a field as a tree; throws mathjs's SyntaxError where there is none. */
export function parseExpression(text: string): MathNode {
  return parse(plainExpression(text));
}
