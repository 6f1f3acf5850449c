/** What a command reads from and writes to. */
export interface Terminal {
  readonly input: AsyncIterable<Uint8Array>;
  /** Resolves when more may be written. */
  out(piece: string | Uint8Array): Promise<void>;
  note(text: string): void;
  /** Progress is rewritten in place on a screen and spaced out in a log. */
  readonly isScreen: boolean;
}
