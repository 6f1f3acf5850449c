import type { Command } from "../command.js";
import { formatDialog } from "../dialogs/formatDialog.js";
import { textDialog } from "../dialogs/textDialog.js";
import { unitDialog } from "../dialogs/unitDialog.js";
import { headerOf, selectedColumns } from "../selected.js";
import type { Shell } from "../shell.js";

export function columnCommands(shell: Shell): Command[] {
  const { page, dialogs } = shell;
  const menu = "Columns";
  const about = ["columns"] as const;
  const sheet = () => page.sheet();
  const columns = () => selectedColumns(page);
  const first = () => page.selection().area.left;
  const last = () => page.selection().area.right;
  const count = () => columns().length;
  const hidden = () => page.sheetState().columnStates.flatMap((state, column) => (state.hidden ? [column] : []));
  const move = (before: number) =>
    void page.act({ do: "reorder columns", sheet: sheet(), from: first(), count: count(), before });
  return [
    {
      id: "unit",
      menu,
      words: "Unit…",
      keys: "Alt+U",
      about,
      run: () => unitDialog(shell, page.selection().active.column),
    },
    { id: "format", menu, words: "Number format…", about, run: () => formatDialog(shell, columns()) },
    {
      id: "width",
      menu,
      words: "Width…",
      about,
      run: () =>
        textDialog(dialogs, {
          title: "Width of the columns",
          label: "Width in pixels, 24 to 2000",
          value: String(page.sheetState().columnStates[first()]?.width ?? 112),
          action: "Set the width",
          check: (text) =>
            Number(text) >= 24 && Number(text) <= 2000
              ? undefined
              : "Type a number of pixels from 24 to 2000, such as 120.",
          done: (text) => void page.act({ do: "width", sheet: sheet(), columns: columns(), width: Number(text) }),
        }),
    },
    {
      id: "insert-column-before",
      menu,
      words: "Insert before",
      apart: true,
      about,
      run: () => void page.act({ do: "insert columns", sheet: sheet(), at: first(), count: count() }),
    },
    {
      id: "insert-column-after",
      menu,
      words: "Insert after",
      about,
      run: () => void page.act({ do: "insert columns", sheet: sheet(), at: last() + 1, count: count() }),
    },
    {
      id: "delete-columns",
      menu,
      words: "Delete",
      about,
      run: () => void page.act({ do: "delete columns", sheet: sheet(), at: first(), count: count() }),
    },
    {
      id: "move-left",
      menu,
      words: "Move left",
      keys: "Alt+Shift+PageUp",
      apart: true,
      about,
      isPossible: () => first() > 0,
      run: () => move(first() - 1),
    },
    {
      id: "move-right",
      menu,
      words: "Move right",
      keys: "Alt+Shift+PageDown",
      about,
      run: () => move(last() + 2),
    },
    {
      id: "hide",
      menu,
      words: "Hide",
      about,
      run: () => void page.act({ do: "hide columns", sheet: sheet(), columns: columns(), hidden: true }),
    },
    {
      id: "show-hidden",
      menu,
      words: "Show all hidden columns",
      about,
      isPossible: () => hidden().length > 0,
      run: () => void page.act({ do: "hide columns", sheet: sheet(), columns: hidden(), hidden: false }),
    },
    {
      id: "freeze",
      menu,
      words: "Keep in view up to this column",
      about,
      run: () => {
        const wanted = last() + 1;
        void page.act({
          do: "freeze",
          sheet: sheet(),
          columns: page.sheetState().frozenColumns === wanted ? 0 : wanted,
        });
      },
      isOn: () => page.sheetState().frozenColumns === last() + 1,
    },
    {
      id: "text-to-number",
      menu,
      words: "Read texts as numbers",
      about,
      run: () => {
        const column = first();
        page.announce(`Reading the texts of ${headerOf(page, column)} as numbers.`);
        void page.act({ do: "text to number", sheet: sheet(), column });
      },
    },
  ];
}
