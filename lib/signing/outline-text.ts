import type { FontkitFont, FontkitPathCommand } from 'fontkit';

/** A turn about the origin (radians, anticlockwise), then a move, of text set along x from the origin. */
interface Turn {
  readonly angle: number;
  readonly x: number;
  readonly y: number;
}

const figure = (value: number) => String(Math.round(value * 1000) / 1000);

function outline(commands: readonly FontkitPathCommand[], scale: number, turn: Turn): string {
  const cos = scale * Math.cos(turn.angle);
  const sin = scale * Math.sin(turn.angle);
  const at = (x: number, y: number) =>
    `${figure(cos * x - sin * y + turn.x)} ${figure(sin * x + cos * y + turn.y)}`;
  let [px, py] = [0, 0];
  const parts = commands.map(({ command, args }) => {
    const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] = args;
    const [fromX, fromY] = [px, py];
    [px, py] = [args.at(-2) ?? px, args.at(-1) ?? py];
    switch (command) {
      case 'moveTo':
        return `${at(a, b)} m`;
      case 'lineTo':
        return `${at(a, b)} l`;
      case 'bezierCurveTo':
        return `${at(a, b)} ${at(c, d)} ${at(e, f)} c`;
      case 'quadraticCurveTo': {
        // The cubic of the same shape: controls two thirds of the way to the quadratic's.
        const first = at(fromX + (2 / 3) * (a - fromX), fromY + (2 / 3) * (b - fromY));
        return `${first} ${at(c + (2 / 3) * (a - c), d + (2 / 3) * (b - d))} ${at(c, d)} c`;
      }
      default:
        return 'h';
    }
  });
  return parts.join(' ');
}

/** Width of a line of text, in the units of `size`. */
export function textWidth(font: FontkitFont, text: string, size: number, spacing = 0): number {
  const { positions } = font.layout(text);
  return positions.reduce(
    (sum, { xAdvance }) => sum + (xAdvance * size) / font.unitsPerEm + spacing,
    -spacing,
  );
}

/** Text centred on `x`, its baseline at `y`, as filled PDF outlines: no font goes into the file. */
export function outlineLine(font: FontkitFont, text: string, x: number, y: number, size: number): string {
  const { glyphs, positions } = font.layout(text);
  const scale = size / font.unitsPerEm;
  let at = x - textWidth(font, text, size) / 2;
  const shapes = glyphs.map((glyph, i) => {
    const shape = outline(glyph.path.commands, scale, { angle: 0, x: at, y });
    at += (positions[i]?.xAdvance ?? glyph.advanceWidth) * scale;
    return shape;
  });
  return `${shapes.join(' ')} f`;
}

export interface Ring {
  readonly x: number;
  readonly y: number;
  /** Of the baseline. */
  readonly radius: number;
  /** At the top reading clockwise, or at the foot reading anticlockwise; upright both. */
  readonly side: 'top' | 'foot';
  readonly spacing: number;
}

/** Text round a circle, centred on its top or its foot. */
export function outlineArc(font: FontkitFont, text: string, size: number, ring: Ring): string {
  const { glyphs, positions } = font.layout(text);
  const scale = size / font.unitsPerEm;
  const sign = ring.side === 'top' ? 1 : -1;
  let along = -textWidth(font, text, size, ring.spacing) / 2;
  const shapes = glyphs.map((glyph, i) => {
    const advance = (positions[i]?.xAdvance ?? glyph.advanceWidth) * scale;
    // Each glyph stands on the tangent at its own middle.
    const angle = (-sign * (along + advance / 2)) / ring.radius;
    along += advance + ring.spacing;
    const x = ring.x + sign * -Math.sin(angle) * ring.radius - (Math.cos(angle) * advance) / 2;
    const y = ring.y + sign * Math.cos(angle) * ring.radius - (Math.sin(angle) * advance) / 2;
    return outline(glyph.path.commands, scale, { angle, x, y });
  });
  return `${shapes.join(' ')} f`;
}
