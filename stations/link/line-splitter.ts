const longestLine = 1024;
const printable = /^[\t\x20-\x7e]*$/;

/** Cuts received bytes into lines. A line that is too long or holds anything but ASCII text is reported as null. */
export class LineSplitter {
  private rest = '';

  constructor(private readonly onLine: (line: string | null) => void) {}

  push(bytes: Buffer): void {
    let text = this.rest + bytes.toString('latin1');
    for (let end = text.indexOf('\n'); end >= 0; end = text.indexOf('\n')) {
      const line = text.slice(0, text[end - 1] === '\r' ? end - 1 : end);
      text = text.slice(end + 1);
      this.onLine(printable.test(line) && line.length <= longestLine ? line : null);
    }
    this.rest = text;
    if (text.length > longestLine) {
      this.rest = '';
      this.onLine(null);
    }
  }

  /** Forgets an unfinished line; tells whether there was one. */
  clear(): boolean {
    const had = this.rest !== '';
    this.rest = '';
    return had;
  }
}
