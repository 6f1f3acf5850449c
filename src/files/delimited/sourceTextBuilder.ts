import type { SourceText } from "./sourceText.js";

/** Keeps a file's text block by block and notes its records as they are found. */
export class SourceTextBuilder {
  private blocks: string[] = [];
  private recordsBefore: number[] = [];
  private recordsOfBlocks = 0;
  private starts = new Uint32Array(256);
  private ends = new Uint32Array(256);
  private widths = new Uint16Array(256);
  private unclosed = false;
  records = 0;

  /** A record of the block that comes next. */
  addRecord(start: number, end: number, width: number, unclosed: boolean): void {
    if (this.records === this.starts.length) {
      this.starts = grown(this.starts, new Uint32Array(this.records * 2));
      this.ends = grown(this.ends, new Uint32Array(this.records * 2));
      this.widths = grown(this.widths, new Uint16Array(this.records * 2));
    }
    this.starts[this.records] = start;
    this.ends[this.records] = end;
    this.widths[this.records] = width;
    this.unclosed = unclosed;
    this.records++;
  }

  addBlock(text: string): void {
    this.blocks.push(text);
    this.recordsBefore.push(this.recordsOfBlocks);
    this.recordsOfBlocks = this.records;
  }

  get isEmpty(): boolean {
    return this.blocks.length === 0;
  }

  finish(): SourceText {
    return {
      blocks: this.blocks,
      recordsBefore: this.recordsBefore,
      records: this.records,
      starts: this.starts.slice(0, this.records),
      ends: this.ends.slice(0, this.records),
      widths: this.widths.slice(0, this.records),
      unclosed: this.unclosed,
    };
  }
}

function grown<T extends Uint32Array | Uint16Array>(old: T, wider: T): T {
  wider.set(old);
  return wider;
}
