import { footFrom, ruleUnderHead } from './page-parts';
import { paper as a4, type Paper } from './paper';

/** Writes downward in a column; what does not fit goes on over the whole width of a new page. */
export class Flow {
  constructor(
    readonly paper: Paper,
    public left: number,
    public y: number,
    private bottom: number = footFrom,
  ) {}

  get width(): number {
    return a4.right - this.left;
  }

  /** Makes room for `height`; true where that began a new page. */
  room(height: number): boolean {
    if (this.y + height <= this.bottom) return false;
    this.paper.pdf.addPage();
    this.left = a4.left;
    this.y = ruleUnderHead + 24;
    this.bottom = a4.bottom;
    return true;
  }

  paragraph(text: string, of: { size: number; ink?: 'ink' | 'ink2'; after: number }): void {
    const step = of.size * 1.42;
    const lines = this.paper.wrap(text, this.width, of);
    this.room(Math.min(lines.length, 3) * step);
    this.paper.element('P', () => {
      // A paragraph longer than a page is not told apart: each line asks for its own room.
      for (const line of lines) {
        this.paper.line(line, this.left, this.y + of.size, of);
        this.y += step;
      }
    });
    this.y += of.after;
  }
}
