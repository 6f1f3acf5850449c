import type { Command } from "../command.js";
import { booksDialog } from "../dialogs/booksDialog.js";
import { namesDialog } from "../dialogs/namesDialog.js";
import { newTableDialog } from "../dialogs/newTableDialog.js";
import { saveDialog } from "../dialogs/saveDialog.js";
import { textDialog } from "../dialogs/textDialog.js";
import type { Shell } from "../shell.js";

export function bookCommands(shell: Shell): Command[] {
  const { page, dialogs, files } = shell;
  const menu = "Book";
  return [
    { id: "open", menu, words: "Open a file…", keys: "Ctrl+O", run: () => files.choose() },
    { id: "new", menu, words: "New table…", run: () => newTableDialog(shell) },
    { id: "books", menu, words: "All books…", run: () => booksDialog(shell) },
    {
      id: "demo",
      menu,
      words: "Open the demo survey",
      run: () => shell.attempt(async () => void (await page.bench.openDemo())),
    },
    { id: "save", menu, words: "Save a copy…", keys: "Ctrl+S", apart: true, run: () => saveDialog(shell) },
    {
      id: "rename",
      menu,
      words: "Rename this book…",
      run: () =>
        textDialog(dialogs, {
          title: "Rename this book",
          label: "Title",
          value: page.state().title,
          action: "Rename",
          done: (title) => shell.attempt(() => page.bench.renameBook(title)),
        }),
    },
    { id: "names", menu, words: "Names…", run: () => namesDialog(shell) },
    {
      id: "add-sheet",
      menu,
      words: "Add a sheet…",
      apart: true,
      run: () =>
        textDialog(dialogs, {
          title: "Add a sheet",
          label: "Name",
          value: freeName(page.state().sheets.map(({ name }) => name)),
          action: "Add",
          done: (name) =>
            shell.attempt(async () => {
              if (await page.act({ do: "add sheet", name })) page.showSheet(page.state().sheets.length - 1);
            }),
        }),
    },
    {
      id: "rename-sheet",
      menu,
      words: "Rename this sheet…",
      run: () =>
        textDialog(dialogs, {
          title: "Rename this sheet",
          label: "Name",
          value: page.sheetState().name,
          action: "Rename",
          done: (name) => void page.act({ do: "rename sheet", sheet: page.sheet(), name }),
        }),
    },
    {
      id: "remove-sheet",
      menu,
      words: "Remove this sheet",
      isPossible: () => page.state().sheets.length > 1,
      run: () => void page.act({ do: "remove sheet", sheet: page.sheet() }),
    },
  ];
}

function freeName(taken: readonly string[]): string {
  for (let number = taken.length + 1; ; number++) {
    const name = `Sheet${number}`;
    if (!taken.includes(name)) return name;
  }
}
