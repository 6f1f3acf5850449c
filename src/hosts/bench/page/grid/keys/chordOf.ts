/** A key press as `Ctrl+Alt+Shift+Key`; letters are the key's own, whatever Alt makes of them. */
export function chordOf(event: KeyboardEvent): string {
  const letter = /^Key([A-Z])$/.exec(event.code)?.[1];
  const isCommand = event.ctrlKey || event.metaKey;
  const key = letter && (isCommand || event.altKey) ? letter : event.key === " " ? "Space" : event.key;
  return `${isCommand ? "Ctrl+" : ""}${event.altKey ? "Alt+" : ""}${event.shiftKey ? "Shift+" : ""}${key}`;
}

/** Whether a key press types a character. */
export function isTyping(event: KeyboardEvent): boolean {
  const isAltGraph = event.getModifierState("AltGraph");
  return [...event.key].length === 1 && (isAltGraph || !(event.ctrlKey || event.metaKey || event.altKey));
}
