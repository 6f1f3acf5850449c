import type { Command } from "../command.js";
import type { Shell } from "../shell.js";

export function editCommands(shell: Shell): Command[] {
  const { page } = shell;
  const menu = "Edit";
  const history = () => page.state().history;
  const area = () => page.selection().area;
  const rows = () => area().bottom - area().top;
  return [
    {
      id: "undo",
      menu,
      words: "Undo",
      keys: "Ctrl+Z",
      isPossible: () => history().present > 0,
      run: () => shell.attempt(async () => void page.settle(await page.bench.undo())),
    },
    {
      id: "redo",
      menu,
      words: "Redo",
      keys: "Ctrl+Shift+Z",
      isPossible: () => history().present < history().labels.length - 1,
      run: () => shell.attempt(async () => void page.settle(await page.bench.redo())),
    },
    {
      id: "edit-cell",
      menu,
      words: "Edit the cell",
      keys: "F2",
      apart: true,
      about: ["cells"],
      leavesTyping: true,
      run: () => shell.editor.beginInCell(undefined),
    },
    {
      id: "edit-in-line",
      menu,
      words: "Edit in the line above the table",
      keys: "Shift+F2",
      leavesTyping: true,
      run: () => shell.editor.beginInLine(),
    },
    {
      id: "clear",
      menu,
      words: "Clear",
      keys: "Delete",
      about: ["cells"],
      run: () => void page.act({ do: "clear", area: area() }),
    },
    {
      id: "fill-over",
      menu,
      words: "Fill the first row down",
      keys: "Ctrl+D",
      apart: true,
      about: ["cells"],
      isPossible: () => rows() > 0,
      run: () => void page.act({ do: "fill over", area: area() }),
    },
    {
      id: "fill-to-end",
      menu,
      words: "Fill down to the table's end",
      keys: "Ctrl+Shift+D",
      about: ["cells"],
      run: () => void page.act({ do: "fill to end", area: area() }),
    },
    {
      id: "fill-series",
      menu,
      words: "Continue the series down to the table's end",
      run: () => {
        const { bottom } = area();
        const count = page.sheetState().rows - 1 - bottom;
        if (count > 0) void page.act({ do: "fill", area: area(), toward: "down", count, series: true });
      },
    },
    {
      id: "find",
      menu,
      words: "Find and replace",
      keys: "Ctrl+F",
      apart: true,
      leavesTyping: true,
      run: () => shell.showPanel("find"),
    },
    {
      id: "go-to",
      menu,
      words: "Go to a cell or target",
      keys: "Ctrl+G",
      run: () => document.querySelector<HTMLInputElement>(".editor-address")?.focus(),
    },
    {
      id: "next-problem",
      menu,
      words: "Next cell that needs attention",
      keys: "Alt+N",
      isPossible: () => page.state().problems > 0,
      run: () =>
        shell.attempt(async () => {
          const place = await page.bench.nextProblem(page.selection().active);
          if (place) {
            const { sheet, row, column } = place;
            page.select({ sheet, top: row, left: column, bottom: row, right: column }, place, { focus: true });
          }
        }),
    },
  ];
}
