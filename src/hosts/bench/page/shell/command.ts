/** Something the analyst can do, in a menu, by keyboard, or both. */
export interface Command {
  readonly id: string;
  readonly menu: MenuName | undefined;
  readonly words: string;
  /** As told in the interface: `Ctrl+Shift+L`. */
  readonly keys?: string;
  /** Starts a new group in its menu. */
  readonly apart?: boolean;
  /** Also offered where cells, rows or columns are asked about. */
  readonly about?: readonly ("cells" | "rows" | "columns")[];
  readonly isOn?: () => boolean;
  readonly isPossible?: () => boolean;
  /** What is being typed in a cell goes on; other commands enter it first. */
  readonly leavesTyping?: true;
  readonly run: () => void;
}

export const menuNames = ["Book", "Edit", "Columns", "Rows", "Look", "Help"] as const;
export type MenuName = (typeof menuNames)[number];
