/** Splits pushed text into lines and numbers them from 1. A line longer than the limit is cut, so that 1 GB of one line cannot fill the memory. */
export class LineSplitter {
  private rest = '';
  private number = 0;
  private overlong = false;

  /** @param onOverlong told once for each line of which something was cut off */
  constructor(private readonly onLine: (text: string, line: number) => void, private readonly onOverlong: (line: number) => void, private readonly longest = 4_000_000) {}

  write(text: string): void {
    let from = 0;
    for (;;) {
      const end = text.indexOf('\n', from);
      if (end < 0) break;
      this.take(text.slice(from, end));
      this.line();
      from = end + 1;
    }
    this.take(from === 0 ? text : text.slice(from));
  }

  end(): void {
    if (this.rest !== '') this.line();
  }

  private take(piece: string): void {
    if (this.overlong || piece === '') return;
    this.rest += piece;
    if (this.rest.length <= this.longest) return;
    this.rest = this.rest.slice(0, this.longest);
    this.overlong = true;
    this.onOverlong(this.number + 1);
  }

  private line(): void {
    const text = this.rest;
    this.rest = '';
    this.overlong = false;
    this.number += 1;
    // Joined files carry a byte order mark in their middle too.
    this.onLine(text.charCodeAt(0) === 0xfeff ? text.slice(1) : text, this.number);
  }
}
