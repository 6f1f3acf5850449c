import type { Terminal } from "./terminal.js";

/** Tells on standard error how far a long piece of work has come; silent while it is short. */
export interface Progress {
  show(doing: string, count: number, counted?: string): void;
  /** Clears the line that `show` rewrites. */
  end(): void;
}

const quietFor = 1000;

export function progressOn(terminal: Terminal): Progress {
  const pause = terminal.isScreen ? 250 : 5000;
  let next = performance.now() + quietFor;
  let shown = 0;
  return {
    show(doing, count, counted = "rows") {
      const now = performance.now();
      if (now < next) return;
      next = now + pause;
      const text = `${doing}: ${count.toLocaleString("en")} ${counted}`;
      terminal.note(terminal.isScreen ? `\r${text.padEnd(shown)}` : `${text}\n`);
      shown = text.length;
    },
    end() {
      if (shown > 0 && terminal.isScreen) terminal.note(`\r${" ".repeat(shown)}\r`);
      shown = 0;
    },
  };
}
