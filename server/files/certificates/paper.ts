import PDFDocument from 'pdfkit';
import { faces, printable, type Face } from '../pdf/faces';

/** A4 in points, with what every page keeps free. */
export const paper = { width: 595.28, height: 841.89, left: 51, right: 544.28, top: 51, bottom: 790 } as const;

/** As the screens' day scheme; each hue also differs from its neighbours in grey. */
export const inks = {
  ink: '#17191e',
  ink2: '#43444a',
  rule: '#78746a',
  hair: '#bbb6a9',
  trip: '#670446',
  tripWash: '#dec7d3',
  release: '#1f6374',
  releaseWash: '#cbdee2',
  white: '#ffffff',
} as const;
export type Ink = keyof typeof inks;

interface Lettering {
  face?: Face;
  size?: number;
  ink?: Ink;
}

/** A PDF that is written in points from the top left, with our faces. Pages stay open until `finish`. */
export class Paper {
  readonly pdf: PDFKit.PDFDocument;
  private readonly chunks: Buffer[] = [];
  private readonly ended: Promise<void>;

  /** `madeAt` also makes the file's identity: the same content gives the same bytes. */
  constructor(info: { title: string; subject: string; madeAt: Date }) {
    this.pdf = new PDFDocument({
      size: [paper.width, paper.height],
      margin: 0,
      bufferPages: true,
      pdfVersion: '1.7',
      tagged: true,
      lang: 'en-GB',
      displayTitle: true,
      info: {
        Title: info.title,
        Subject: info.subject,
        Author: 'Sillwright',
        Creator: 'Sillwright',
        CreationDate: info.madeAt,
        ModDate: info.madeAt,
      },
    });
    this.pdf.on('data', (chunk: Buffer) => this.chunks.push(chunk));
    this.ended = new Promise((resolve, reject) => this.pdf.once('end', resolve).once('error', reject));
  }

  private letter({ face = 'text', size = 9, ink = 'ink' }: Lettering): void {
    this.pdf.font(faces[face]).fontSize(size).fillColor(inks[ink]);
  }

  /** One line with its baseline at `y`; `anchor` says which end or middle stands at `x`. */
  line(text: string, x: number, y: number, of: Lettering & { anchor?: 'start' | 'middle' | 'end' } = {}): number {
    this.letter(of);
    const said = printable(text);
    const width = this.pdf.widthOfString(said);
    const shift = of.anchor === 'end' ? width : of.anchor === 'middle' ? width / 2 : 0;
    this.pdf.text(said, x - shift, y, { lineBreak: false, baseline: 'alphabetic' });
    return width;
  }

  widthOf(text: string, of: Lettering): number {
    this.letter(of);
    return this.pdf.widthOfString(printable(text));
  }

  /** Lines of at most `width`, broken between words; a word that is longer is broken within. */
  wrap(text: string, width: number, of: Lettering): string[] {
    this.letter(of);
    const lines: string[] = [];
    let line = '';
    const fits = (candidate: string) => this.pdf.widthOfString(candidate) <= width;
    for (const word of printable(text).split(' ')) {
      let rest = word;
      if (line && !fits(`${line} ${rest}`)) {
        lines.push(line);
        line = '';
      }
      while (!line && !fits(rest)) {
        let n = rest.length - 1;
        while (n > 1 && !fits(rest.slice(0, n))) n--;
        lines.push(rest.slice(0, n));
        rest = rest.slice(n);
      }
      line = line ? `${line} ${rest}` : rest;
    }
    return line ? [...lines, line] : lines;
  }

  rule(x1: number, x2: number, y: number, width = 0.75, ink: Ink = 'ink'): void {
    this.pdf.moveTo(x1, y).lineTo(x2, y).lineWidth(width).stroke(inks[ink]);
  }

  /** What `draw` draws counts as one element of the document's structure, for those who hear it. */
  element(kind: 'H1' | 'P' | 'Figure', draw: () => void, alt?: string): void {
    const content = this.pdf.markStructureContent(kind, alt ? { alt } : {});
    draw();
    this.pdf.endMarkedContent();
    this.pdf.addStructure(this.pdf.struct(kind, alt ? { alt } : {}, [content]));
  }

  /** Drawn around the content of every page, such as its head: no part of what is read aloud. */
  artifact(draw: () => void): void {
    this.pdf.markContent('Artifact', { type: 'Layout' });
    draw();
    this.pdf.endMarkedContent();
  }

  async finish(): Promise<Buffer> {
    this.pdf.end();
    await this.ended;
    return Buffer.concat(this.chunks);
  }
}
