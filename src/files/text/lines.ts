const carriageReturn = 13;

/** Splits text that arrives in pieces into lines; the line ending, LF, CRLF or CR alone, belongs to no line. */
export class Lines {
  private rest = "";

  /** `take` gets each whole line of the text so far. */
  push(text: string, take: (line: string) => void): void {
    const all = this.rest + text;
    let from = 0;
    for (let feed = all.indexOf("\n"); feed >= 0; feed = all.indexOf("\n", from)) {
      const end = feed > from && all.charCodeAt(feed - 1) === carriageReturn ? feed - 1 : feed;
      for (const line of linesWithin(all.slice(from, end))) take(line);
      from = feed + 1;
    }
    this.rest = all.slice(from);
  }

  end(take: (line: string) => void): void {
    if (this.rest !== "") for (const line of linesWithin(this.rest.replace(/\r$/, ""))) take(line);
    this.rest = "";
  }
}

function linesWithin(text: string): readonly string[] {
  return text.includes("\r") ? text.split("\r") : [text];
}
