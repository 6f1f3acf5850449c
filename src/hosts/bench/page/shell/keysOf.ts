const isMac = /Mac|iPhone|iPad/.test(navigator.platform);

/** A key press as commands spell it: `Ctrl+Shift+Z`; the command key of some keyboards counts as Ctrl. */
export function keysOf(event: KeyboardEvent): string {
  const key = event.key.length === 1 ? event.key.toUpperCase() : event.key;
  // With Alt some keyboards give another character; the key itself is meant.
  const letter = event.altKey && /^Key[A-Z]$/.test(event.code) ? event.code.slice(3) : key;
  return [
    event.ctrlKey || event.metaKey ? "Ctrl+" : "",
    event.altKey ? "Alt+" : "",
    event.shiftKey && (event.key.length > 1 || /[A-Z]/.test(letter)) ? "Shift+" : "",
    letter,
  ].join("");
}

/** The same as this machine's keyboard is labelled. */
export function keysText(keys: string): string {
  return isMac ? keys.replace("Ctrl+", "Command+").replace("Alt+", "Option+") : keys;
}
