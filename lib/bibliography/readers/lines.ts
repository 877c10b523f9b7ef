/** Splits pushed text into lines and numbers them from 1. A line longer than the limit comes in pieces, so that 1 GB of one line cannot fill the memory. */
export class LineSplitter {
  private rest = '';
  private number = 0;
  private overlong = false;
  constructor(private readonly onLine: (text: string, line: number) => void, private readonly longest = 4_000_000, private readonly onOverlong?: (line: number) => void) {}

  write(text: string): void {
    let from = 0;
    for (;;) {
      const end = text.indexOf('\n', from);
      if (end < 0) break;
      this.line(this.rest + text.slice(from, end));
      this.rest = '';
      this.overlong = false;
      from = end + 1;
    }
    if (this.rest.length + text.length - from <= this.longest) this.rest += text.slice(from);
    else if (!this.overlong) {
      this.rest = (this.rest + text.slice(from, from + this.longest)).slice(0, this.longest);
      this.overlong = true;
      this.onOverlong?.(this.number + 1);
    }
  }

  end(): void {
    if (this.rest !== '') this.line(this.rest);
    this.rest = '';
  }

  private line(text: string): void {
    this.number += 1;
    this.onLine(text, this.number);
  }
}
