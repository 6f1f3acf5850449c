import type { Command } from "../command.js";
import { filterDialog } from "../dialogs/filterDialog.js";
import { sortDialog } from "../dialogs/sortDialog.js";
import { isFiltered } from "../isFiltered.js";
import type { Shell } from "../shell.js";
import { showOnly } from "../showOnly.js";

export function rowCommands(shell: Shell): Command[] {
  const { page } = shell;
  const menu = "Rows";
  const about = ["rows"] as const;
  const area = () => page.selection().area;
  const count = () => area().bottom - area().top + 1;
  const isWhole = () => !isFiltered(page);
  return [
    { id: "sort", menu, words: "Sort…", keys: "Alt+S", about: ["rows", "columns"], run: () => sortDialog(shell) },
    { id: "filter", menu, words: "Filter…", keys: "Alt+F", about: ["rows", "columns"], run: () => filterDialog(shell) },
    {
      id: "only-these",
      menu,
      words: "Show only the marked or selected rows",
      about,
      run: () => shell.attempt(async () => void page.settle(await showOnly(page))),
    },
    {
      id: "no-filter",
      menu,
      words: "Show all rows",
      isPossible: () => isFiltered(page),
      run: () => shell.attempt(async () => void page.settle(await page.bench.filter(page.sheet(), []))),
    },
    {
      id: "insert-row-above",
      menu,
      words: "Insert above",
      apart: true,
      about,
      isPossible: isWhole,
      run: () => void page.act({ do: "insert rows", sheet: page.sheet(), at: area().top, count: count() }),
    },
    {
      id: "insert-row-below",
      menu,
      words: "Insert below",
      about,
      isPossible: isWhole,
      run: () => void page.act({ do: "insert rows", sheet: page.sheet(), at: area().bottom + 1, count: count() }),
    },
    {
      id: "delete-rows",
      menu,
      words: "Delete",
      about,
      isPossible: isWhole,
      run: () => void page.act({ do: "delete rows", sheet: page.sheet(), at: area().top, count: count() }),
    },
  ];
}
