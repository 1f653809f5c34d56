import PDFDocument from 'pdfkit';
import { canShow, faces, fontPath, type Face } from './paper-fonts.ts';
import { cutLines, linesOf, runsOf, withoutRaisedMinus, type Typesetter } from './text-lines.ts';

/** Ink on white paper; vermilion and blue-green mean on paper what they mean on the pages. */
export const ink = {
  full: '#1b2128',
  soft: '#454b52',
  faint: '#5f625f',
  hairline: '#b9b2a1',
  wash: '#efeade',
  paper: '#ffffff',
  evidence: '#b5300f',
  fit: '#0b6361',
  fitWash: '#d3e5dd',
  explained: '#8f8a7c',
} as const;
export type Ink = (typeof ink)[keyof typeof ink];

export interface TextStyle {
  size?: number;
  face?: Face;
  color?: Ink;
  /** What goes over it is cut off with an ellipsis. */
  maxLines?: number;
  align?: 'left' | 'right' | 'center';
}

/** ISO A4 at 72 points an inch. */
export const pageWidth = 595.28;
const pageHeight = 841.89;
export const margin = 36;
export const contentWidth = pageWidth - 2 * margin;
const footHeight = 40;
const bottom = pageHeight - margin - footHeight;
const lineFactor = 1.28;
const normalSize = 8.5;

export interface SheetFacts {
  title: string;
  siteName: string;
  /** Day on which the paper was made, ISO. */
  printedOn: string;
  /** Stands at the foot of every page. */
  caution: string;
}

/** A document in the making: pages, a place on the page that goes down, text in the right fonts. */
export class Sheet {
  readonly doc: PDFKit.PDFDocument;
  /** Where the next block begins. */
  y = margin;
  private readonly facts: SheetFacts;

  constructor(facts: SheetFacts) {
    this.facts = facts;
    this.doc = new PDFDocument({
      size: 'A4',
      // The foot of a page is written below the margin; pdfkit would begin a page for it.
      margins: { top: margin, bottom: 0, left: margin, right: margin },
      bufferPages: true,
      lang: 'en',
      info: { Title: `${facts.title}, ${facts.siteName}`, Creator: 'Fretline' },
    });
    for (const face of faces) this.doc.registerFont(face, fontPath(face));
  }

  get left(): number {
    return bottom - this.y;
  }

  /** Goes to a new page where the block would not fit on this one. */
  ensure(height: number): boolean {
    if (height <= this.left) return false;
    this.newPage();
    return true;
  }

  newPage(): void {
    this.doc.addPage();
    this.y = margin;
  }

  lines(text: string, width: number, style: TextStyle = {}): string[] {
    const { size = normalSize, face = 'text', maxLines = Infinity } = style;
    const setter = this.setter(size);
    return cutLines(
      linesOf(withoutRaisedMinus(text), width, face, setter),
      maxLines,
      width,
      face,
      setter,
    );
  }

  heightOf(text: string, width: number, style: TextStyle = {}): number {
    return this.lines(text, width, style).length * lineHeight(style);
  }

  /** Writes at a place without moving the sheet's own; returns the height. */
  textAt(text: string, x: number, y: number, width: number, style: TextStyle = {}): number {
    const lines = this.lines(text, width, style);
    lines.forEach((line, index) =>
      this.lineAt(line, x, y + index * lineHeight(style), width, style),
    );
    return lines.length * lineHeight(style);
  }

  /** Writes over the whole width and goes on below, over as many pages as it takes. */
  paragraph(text: string, style: TextStyle & { indent?: number } = {}): void {
    const indent = style.indent ?? 0;
    for (const line of this.lines(text, contentWidth - indent, style)) {
      this.ensure(lineHeight(style));
      this.lineAt(line, margin + indent, this.y, contentWidth - indent, style);
      this.y += lineHeight(style);
    }
  }

  heading(text: string, keepWith = 24): void {
    this.ensure(24 + keepWith);
    this.y += 8;
    this.rule(this.y);
    this.y += 4;
    this.textAt(text, margin, this.y, contentWidth, { face: 'strong', size: 10 });
    this.y += 15;
  }

  rule(y: number, color: Ink = ink.full, x = margin, width = contentWidth): void {
    this.doc
      .moveTo(x, y)
      .lineTo(x + width, y)
      .lineWidth(0.6)
      .strokeColor(color)
      .stroke();
  }

  /** A box to tick by hand, or ticked. */
  box(x: number, y: number, ticked = false): void {
    const side = 8;
    this.doc.rect(x, y, side, side).lineWidth(0.7).strokeColor(ink.full).stroke();
    if (!ticked) return;
    const [near, far] = [1.6, side - 1.6];
    this.doc.moveTo(x + near, y + near).lineTo(x + far, y + far);
    this.doc.moveTo(x + near, y + far).lineTo(x + far, y + near);
    this.doc.lineWidth(1.1).strokeColor(ink.full).stroke();
  }

  /** Writes the foot of every page and closes the document. */
  async finish(): Promise<Buffer> {
    const { count } = this.doc.bufferedPageRange();
    for (let page = 0; page < count; page += 1) {
      this.doc.switchToPage(page);
      this.foot(page + 1, count);
    }
    const pieces: Buffer[] = [];
    this.doc.on('data', (piece: Buffer) => pieces.push(piece));
    const ended = new Promise<void>((resolve, reject) => {
      this.doc.on('end', resolve);
      this.doc.on('error', reject);
    });
    this.doc.end();
    await ended;
    return Buffer.concat(pieces);
  }

  private foot(page: number, count: number): void {
    const y = bottom + 8;
    this.rule(y, ink.hairline);
    const style = { size: 7, color: ink.faint } as const;
    this.textAt(this.facts.caution, margin, y + 4, contentWidth - 90, { ...style, maxLines: 2 });
    this.textAt(`Page ${page} of ${count}`, margin, y + 4, contentWidth, {
      ...style,
      align: 'right',
    });
    this.textAt(
      `Fretline · ${this.facts.siteName} · ${this.facts.title} · made on ${this.facts.printedOn}`,
      margin,
      y + 24,
      contentWidth,
      { ...style, maxLines: 1 },
    );
  }

  private lineAt(line: string, x: number, y: number, width: number, style: TextStyle): void {
    const { size = normalSize, face = 'text', color = ink.full, align = 'left' } = style;
    const setter = this.setter(size);
    const runs = runsOf(line, face, setter).map((run) => ({ run, width: setter.widthOf(run) }));
    const used = runs.reduce((sum, one) => sum + one.width, 0);
    let at = x + (align === 'right' ? width - used : align === 'center' ? (width - used) / 2 : 0);
    this.doc.fillColor(color);
    for (const { run, width: runWidth } of runs) {
      this.doc
        .font(run.face)
        .fontSize(size)
        .text(run.text, at, y + size * 0.95, {
          lineBreak: false,
          baseline: 'alphabetic',
        });
      at += runWidth;
    }
  }

  private setter(size: number): Typesetter {
    return {
      canShow,
      widthOf: ({ text, face }) => this.doc.font(face).fontSize(size).widthOfString(text),
    };
  }
}

export const lineHeight = ({ size = normalSize }: TextStyle): number => size * lineFactor;
