import type { Command } from "../command.js";
import { aboutDialog } from "../dialogs/aboutDialog.js";
import { functionsDialog } from "../dialogs/functionsDialog.js";
import { keysDialog } from "../dialogs/keysDialog.js";
import type { Shell } from "../shell.js";

export function helpCommands(shell: Shell, all: () => readonly Command[]): Command[] {
  const menu = "Help";
  return [
    {
      id: "functions",
      menu,
      leavesTyping: true,
      words: "Functions by question…",
      keys: "F1",
      run: () => functionsDialog(shell),
    },
    { id: "keys", menu, leavesTyping: true, words: "Keys", keys: "Ctrl+/", run: () => keysDialog(shell, all()) },
    { id: "about", menu, leavesTyping: true, words: "About this page", run: () => aboutDialog(shell) },
  ];
}
