// server only
import * as fontkit from 'fontkit';
import { outlineArc, outlineLine, textWidth } from './outline-text';

/** What a seal shows, as its jurisdiction's profile words it. */
export interface SealText {
  /** Round the top: "Structural Engineer". */
  readonly title: string;
  /** Round the foot: "Port Halden". */
  readonly jurisdiction: string;
  readonly name: string;
  readonly licenceNumber: string;
  /** "30 Jun 2027" */
  readonly licenceExpires: string;
  /** The day of sealing: "19 Nov 2026". */
  readonly date: string;
}

/** Inter in weights 400, 500 and 600, as TrueType files. */
export interface SealFonts {
  readonly regular: Uint8Array;
  readonly medium: Uint8Array;
  readonly semibold: Uint8Array;
}

/** Drawn in a square of this side and scaled to the field. */
const side = 200;
const middle = side / 2;
/** #B4231B */
const red = '0.7059 0.1373 0.1059';
/** A circle's quarter as one Bézier curve: control at 4/3 (√2 − 1) of the radius. */
const k = (4 / 3) * (Math.SQRT2 - 1);

function circle(x: number, y: number, r: number): string {
  const c = k * r;
  return [
    `${x + r} ${y} m`,
    `${x + r} ${y + c} ${x + c} ${y + r} ${x} ${y + r} c`,
    `${x - c} ${y + r} ${x - r} ${y + c} ${x - r} ${y} c`,
    `${x - r} ${y - c} ${x - c} ${y - r} ${x} ${y - r} c`,
    `${x + c} ${y - r} ${x + r} ${y - c} ${x + r} ${y} c h`,
  ].join(' ');
}

/** Between the letters round the ring, as a part of their size. */
const letterSpacing = 0.107;

/** The largest size up to `wanted` at which text keeps within `width`; `spacing` is a part of the size. */
function fittingSize(
  font: fontkit.FontkitFont,
  text: string,
  wanted: number,
  width: number,
  spacing = 0,
): number {
  return Math.min(wanted, (wanted * width) / textWidth(font, text, wanted, spacing * wanted));
}

/**
 * A round seal in two rings, as PDF operators that fill a box of the given width and height: lines and outlines only, so it
 * needs no resources and no font. Throws when a font lacks a character.
 */
export function drawSeal(text: SealText, fonts: SealFonts): (width: number, height: number) => string {
  const [regular, medium, semibold] = [fonts.regular, fonts.medium, fonts.semibold].map((bytes) =>
    fontkit.create(Buffer.from(bytes)),
  ) as [fontkit.FontkitFont, fontkit.FontkitFont, fontkit.FontkitFont];
  for (const character of Object.values(text).join('')) {
    if (!regular.hasGlyphForCodePoint(character.codePointAt(0) as number)) {
      throw new Error(`the seal's font has no ${character}`);
    }
  }
  // Each at most a part of its half of the ring, so that the two never meet the dots between them.
  const arc = (words: string, wanted: number, radius: number, side: 'top' | 'foot') => {
    const longest = Math.PI * radius * (side === 'top' ? 0.84 : 0.7);
    const size = fittingSize(medium, words, wanted, longest, letterSpacing);
    const spacing = letterSpacing * size;
    return outlineArc(medium, words, size, { x: middle, y: middle, radius, side, spacing });
  };
  const line = (font: fontkit.FontkitFont, words: string, down: number, wanted: number, width: number) =>
    outlineLine(font, words, middle, side - down, fittingSize(font, words, wanted, width));
  const parts = [
    `${red} rg ${red} RG`,
    `2.2 w ${circle(middle, middle, 97)} S`,
    `0.9 w ${circle(middle, middle, 92.4)} S ${circle(middle, middle, 66)} S`,
    `${circle(20.8, middle, 2)} f ${circle(179.2, middle, 2)} f`,
    arc(text.title, 15, 74, 'top'),
    arc(text.jurisdiction, 14, 84, 'foot'),
    line(semibold, text.name, 82, 17.5, 112),
    line(regular, `licence ${text.licenceNumber}`, 103, 13.5, 118),
    line(regular, `to ${text.licenceExpires}`, 121, 11, 110),
    line(regular, `sealed ${text.date}`, 138, 11, 94),
  ];
  return (width, height) => {
    const scale = Math.min(width, height) / side;
    const [x, y] = [(width - side * scale) / 2, (height - side * scale) / 2];
    // A PDF knows no exponents: what is left of a rounding must not be written as 7e-15.
    const [s, dx, dy] = [scale, x, y].map((n) => n.toFixed(5));
    return `q ${s} 0 0 ${s} ${dx} ${dy} cm ${parts.join('\n')} Q`;
  };
}
