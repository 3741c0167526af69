/** The part of pdfkit 0.20.1 that the printed page uses; the package ships no types of its own. */
declare module 'pdfkit' {
  import type { FontkitFont } from 'fontkit';

  export interface PdfFont {
    readonly id: string;
    /** Glyphs of the text as four hex digits each, taken into the embedded subset. */
    encode(text: string): [string[], unknown];
    ref(): unknown;
  }
  export interface PdfOutline {
    addItem(
      title: string,
      options?: { pageNumber?: number; top?: number; left?: number; expanded?: boolean; fit?: boolean },
    ): PdfOutline;
  }
  export interface PdfOptions {
    compress?: boolean;
    pdfVersion?: '1.4' | '1.7';
    lang?: string;
    displayTitle?: boolean;
    autoFirstPage?: boolean;
    font?: string | null;
    info?: Record<string, string | Date | undefined>;
  }
  export default class PDFDocument {
    constructor(options: PdfOptions);
    readonly page: { fonts: Record<string, unknown>; readonly width: number; readonly height: number };
    readonly outline: PdfOutline;
    readonly _font: PdfFont;
    info: Record<string, string | Date | undefined>;
    /** Writes the XMP packet from `info`; called by end(). */
    endMetadata(): void;
    readonly _root: { readonly data: Record<string, unknown> };
    on(event: 'data', listener: (chunk: Uint8Array) => void): this;
    on(event: 'end', listener: () => void): this;
    on(event: 'error', listener: (cause: unknown) => void): this;
    font(source: FontkitFont, name: string): this;
    addContent(content: string): this;
    markContent(tag: string, options?: { actual?: string; alt?: string; lang?: string }): this;
    endMarkedContent(): this;
    save(): this;
    restore(): this;
    transform(a: number, b: number, c: number, d: number, e: number, f: number): this;
    fillColor(colour: string): this;
    strokeColor(colour: string): this;
    lineWidth(width: number): this;
    dash(lengths: readonly number[], options?: object): this;
    undash(): this;
    moveTo(x: number, y: number): this;
    lineTo(x: number, y: number): this;
    rect(x: number, y: number, width: number, height: number): this;
    circle(x: number, y: number, radius: number): this;
    polygon(...points: number[][]): this;
    path(d: string): this;
    clip(): this;
    fill(colour?: string): this;
    stroke(colour?: string): this;
    fillAndStroke(fill?: string, stroke?: string): this;
    goTo(x: number, y: number, width: number, height: number, name: string): this;
    addNamedDestination(name: string, ...place: (string | number | null)[]): this;
    file(
      bytes: Uint8Array,
      options: {
        name: string;
        type: string;
        description: string;
        relationship: 'Data' | 'Source';
        creationDate: Date;
        modifiedDate: Date;
      },
    ): unknown;
  }
}

declare module '@react-pdf/layout' {
  export default function layoutDocument(root: unknown, fonts: unknown): Promise<unknown>;
}

declare module '@react-pdf/render' {
  import type PDFDocument from 'pdfkit';
  export default function renderPDF(context: PDFDocument, layout: unknown): PDFDocument;
}
