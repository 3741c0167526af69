import type PDFDocument from 'pdfkit';
import type { PdfFont } from 'pdfkit';
import { breakRich } from '@/lib/typeset/break-rich';
import type { Face, Glyph } from '@/lib/typeset/face';
import type { Laid } from '@/lib/typeset/laid';
import type { RichLine } from '@/lib/typeset/rich-line';
import type { ShapedText } from '@/lib/typeset/shape-text';
import { texInWords } from '@/lib/typeset/tex-in-words';
import type { Typesetter } from '@/lib/typeset/typesetter';
import { LOOKS } from './paper-look';

const points = (value: number): string => `${Math.round(value * 1000) / 1000 || 0}`;
/** Numbers that read the same with and without TeX need no alternative text. */
const PLAIN = /^[\w.,()/]*$/;

/**
 * Writes set matter into a PDF page as text in embedded faces, with rules and outlines beside it. pdfkit's page has y
 * running down; glyph ids and the fonts' resources are the only parts of pdfkit reached below its drawing interface.
 */
export class PaperPen {
  private readonly fonts = new Map<Face, { font: PdfFont; ids: Map<number, string> }>();

  constructor(
    readonly doc: PDFDocument,
    private readonly typesetter: Typesetter,
  ) {}

  /** A label of a drawing as one line; `size` is that of its words. */
  label(text: string, size: number): RichLine | undefined {
    return breakRich(text, { ...LOOKS.text, size }, Number.POSITIVE_INFINITY, this.typesetter)[0];
  }

  words(
    shaped: ShapedText,
    x: number,
    y: number,
    size: number,
    colour: string,
    tracking = 0,
    space = false,
  ): void {
    this.doc.fillColor(colour);
    const parts = shaped.runs.map((run, index) => {
      const last = index === shaped.runs.length - 1;
      const start = x + (run.x + tracking * index) * size;
      return this.run(run.face, run.glyphs, run.advances, start, y, size, {
        tracking,
        space: last && space,
        text: run.text,
      });
    });
    this.doc.addContent(`BT\n${parts.join('')}ET`);
  }

  /** A formula with its baseline starting at (x, y); readers and copying get it in plain characters. */
  math(laid: Laid, tex: string, x: number, y: number, size: number, colour: string): void {
    const { doc } = this;
    const marked = !PLAIN.test(tex);
    if (marked) doc.markContent('Span', { actual: texInWords(tex) });
    let text = '';
    for (const mark of laid.marks) {
      if (mark.kind !== 'glyphs') continue;
      if (mark.colour) text += `${rgb(mark.colour)} rg\n`;
      text += this.run(
        mark.face,
        mark.glyphs,
        mark.advances,
        x + mark.x * size,
        y - mark.y * size,
        mark.size * size,
        {},
      );
      if (mark.colour) text += `${rgb(colour)} rg\n`;
    }
    doc.fillColor(colour);
    if (text) doc.addContent(`BT\n${text}ET`);
    this.shapes(laid, x, y, size, colour);
    if (marked) doc.endMarkedContent();
  }

  private shapes(laid: Laid, x: number, y: number, size: number, colour: string): void {
    const { doc } = this;
    for (const mark of laid.marks) {
      if (mark.kind === 'glyphs') continue;
      const tone = mark.colour ?? colour;
      if (mark.kind === 'rule') {
        doc
          .rect(x + mark.x * size, y - (mark.y + mark.height) * size, mark.width * size, mark.height * size)
          .fill(tone);
      } else if (mark.kind === 'frame') {
        const line = mark.thickness * size;
        const top = y - (mark.y + mark.height) * size + line / 2;
        doc
          .lineWidth(line)
          .rect(x + mark.x * size + line / 2, top, mark.width * size - line, mark.height * size - line);
        doc.stroke(tone);
      } else if (mark.kind === 'stroke') {
        doc.lineWidth(mark.thickness * size).moveTo(x + mark.x1 * size, y - mark.y1 * size);
        doc.lineTo(x + mark.x2 * size, y - mark.y2 * size).stroke(tone);
      } else {
        doc.save();
        if (mark.clip) {
          const { clip } = mark;
          doc
            .rect(x + clip.x * size, y - (clip.y + clip.height) * size, clip.width * size, clip.height * size)
            .clip();
        }
        doc.transform(mark.scaleX * size, 0, 0, mark.scaleY * size, x + mark.x * size, y - mark.y * size);
        doc.path(mark.d).fill(tone).restore();
        doc.fillColor(colour);
      }
    }
  }

  /** Text operators of one run (ISO 32000-1, 9.4): face, place, glyphs with what kerning takes between them. */
  private run(
    face: Face,
    glyphs: readonly Glyph[],
    advances: readonly number[],
    x: number,
    y: number,
    size: number,
    { tracking = 0, space = false, text }: { tracking?: number; space?: boolean; text?: string },
  ): string {
    const { font, ids } = this.embedded(face);
    const encoded = text === undefined ? undefined : font.encode(text)[0];
    let shown = '<';
    glyphs.forEach((glyph, index) => {
      shown += encoded?.[index] ?? this.glyphId(font, ids, glyph);
      const adjust = Math.round((glyph.advance - (advances[index] ?? 0) - tracking) * 1000);
      if (adjust !== 0 && (index < glyphs.length - 1 || space)) shown += `> ${adjust} <`;
    });
    if (space) shown += font.encode(' ')[0].join('');
    return `/${font.id} ${points(size)} Tf 1 0 0 -1 ${points(x)} ${points(y)} Tm [${shown}>] TJ\n`;
  }

  private embedded(face: Face): { font: PdfFont; ids: Map<number, string> } {
    const { doc } = this;
    let embedded = this.fonts.get(face);
    if (!embedded) {
      embedded = { font: doc.font(face.font, face.name)._font, ids: new Map() };
      this.fonts.set(face, embedded);
    }
    doc.page.fonts[embedded.font.id] ??= embedded.font.ref();
    return embedded;
  }

  private glyphId(font: PdfFont, ids: Map<number, string>, glyph: Glyph): string {
    let id = ids.get(glyph.id);
    if (id === undefined) {
      id = font.encode(String.fromCodePoint(...glyph.codePoints))[0].join('');
      ids.set(glyph.id, id);
    }
    return id;
  }
}

function rgb(colour: string): string {
  const parts = /^#(..)(..)(..)$/.exec(colour);
  if (!parts) throw new RangeError(`Colours on paper are written #rrggbb, not ${colour}.`);
  return parts
    .slice(1)
    .map((part) => points(Number.parseInt(part, 16) / 255))
    .join(' ');
}
