import { render } from "lit-html";
import type { Summary } from "../../protocol/answers.js";
import { faultText, type OwnedPage } from "../createPage.js";
import type { CreateEditor, Editor } from "../editor/editor.js";
import type { CreateGrid } from "../grid/grid.js";
import type { CreatePanel, Panel } from "../panel.js";
import { clipboardOf } from "./clipboard.js";
import type { Command } from "./command.js";
import { bookCommands } from "./commands/bookCommands.js";
import { columnCommands } from "./commands/columnCommands.js";
import { editCommands } from "./commands/editCommands.js";
import { helpCommands } from "./commands/helpCommands.js";
import { lookCommands } from "./commands/lookCommands.js";
import { rowCommands } from "./commands/rowCommands.js";
import { unitDialog } from "./dialogs/unitDialog.js";
import { createDialogs } from "./dialogs.js";
import { dragSide } from "./dragSide.js";
import { takeDrops } from "./drops.js";
import { createFiles } from "./files.js";
import { footView, type Progress } from "./footView.js";
import { headView } from "./headView.js";
import { keysOf } from "./keysOf.js";
import { createMenuBar } from "./menuBar.js";
import { createParts } from "./parts.js";
import { showPlots } from "./plots.js";
import type { Shell } from "./shell.js";
import { sideView } from "./sideView.js";
import type { Skeleton } from "./skeleton.js";

export interface StartedShell {
  progress(progress: Progress | undefined): void;
  /** Takes up what was typed and not entered when the page was closed. */
  resumeDraft(): Promise<void>;
}

/** Builds what stands around the grid, and joins the parts. */
export function startShell(
  skeleton: Skeleton,
  page: OwnedPage,
  createPanels: readonly CreatePanel[],
  createGrid: CreateGrid,
  createEditor: CreateEditor,
): StartedShell {
  const dialogs = createDialogs(skeleton.root);
  const files = createFiles(skeleton.root, page);
  const clipboard = clipboardOf(page, files);
  // The grid asks while it is made, before there is an editor.
  let typing: Editor | undefined;
  const grid = createGrid(skeleton.grid, page, {
    isPicking: () => typing?.isPicking() ?? false,
    pick: (area, done) => typing?.pick(area, done),
    edit: (typed) => typing?.beginInCell(typed),
    openUnit: (column) => unitDialog(shell, column),
    openMenu: (about, at) => menus.openAt(about, at),
    copy: (cut) => clipboard.copy(cut),
    paste: (data) => clipboard.paste(data),
  });
  const editor = createEditor(skeleton.line, page, grid);
  typing = editor;
  const panels: readonly Panel[] = createPanels.map((create) => create(page, drawSide, () => editor.commit()));
  const attempt = (work: () => Promise<void>) => {
    work().catch((fault: unknown) => page.trouble(faultText(fault)));
  };
  const shell: Shell = { page, dialogs, grid, editor, files, showPanel, attempt };
  const commands: readonly Command[] = [
    ...bookCommands(shell),
    ...editCommands(shell),
    ...columnCommands(shell),
    ...rowCommands(shell),
    ...lookCommands(shell, panels),
    ...helpCommands(shell, () => commands),
  ];
  /** A command is about the book with what was typed last; a text that cannot be entered is to be mended first. */
  const run = (command: Command) => {
    if (command.leavesTyping || !editor.editing()) return command.run();
    attempt(async () => {
      if (await editor.commit()) command.run();
    });
  };
  const menus = createMenuBar(
    () => commands,
    drawHead,
    () => grid.focus(),
    run,
  );
  const byId = (id: string) => commands.find((command) => command.id === id);
  const runById = (id: string) => {
    const command = byId(id);
    if (command) run(command);
  };
  const goToPart = createParts(skeleton, () => grid.focus());
  let summary: Summary | undefined;
  let progress: Progress | undefined;
  let summed = 0;
  let shownPanel: Panel | undefined;

  function drawHead(): void {
    render(
      headView(page, menus.view(), () => runById("rename")),
      skeleton.head,
    );
    document.title = `${page.state().title} - Barycell`;
  }

  function drawFoot(): void {
    render(
      footView(page, summary, progress, {
        nextProblem: () => runById("next-problem"),
        cancel: () => attempt(() => page.bench.cancel()),
        showAll: () => runById("no-filter"),
      }),
      skeleton.foot,
    );
  }

  function drawSide(): void {
    skeleton.side.hidden = page.preferences().panel === "";
    render(sideView(page, panels, { show: showPanel, hide: () => page.prefer({ panel: "" }) }), skeleton.side);
  }

  function showPanel(id: string): void {
    if (page.preferences().panel === id) panels.find((panel) => panel.id === id)?.shown();
    else page.prefer({ panel: id });
  }

  /** The panel that the preferences name is told that it is seen, the one before that it is not. */
  function followPanel(): void {
    const wanted = panels.find(({ id }) => id === page.preferences().panel);
    drawSide();
    if (wanted === shownPanel) return;
    shownPanel?.hidden();
    shownPanel = wanted;
    wanted?.shown();
  }

  function summarise(): void {
    summed += 1;
    const mine = summed;
    page.bench.summarise(page.selection().area).then(
      (answer) => {
        if (mine !== summed) return;
        summary = answer;
        drawFoot();
      },
      () => {},
    );
  }

  page.onChange((change) => {
    if (change === "state" || change === "sheet") drawHead();
    if (change === "state" || change === "selection") summarise();
    if (change === "preferences") {
      drawHead();
      followPanel();
    }
    drawFoot();
    shownPanel?.changed(change);
  });
  page.onSelect(({ reveal = true, focus = false }) => {
    if (reveal) grid.reveal(page.selection().active);
    if (focus) grid.focus();
  });
  document.addEventListener("keydown", (event) => {
    if (event.defaultPrevented || dialogs.isOpen()) return;
    const keys = keysOf(event);
    if (keys === "F6" || keys === "Shift+F6") {
      event.preventDefault();
      menus.close();
      return goToPart(event.shiftKey);
    }
    const command = commands.find((each) => each.keys === keys) ?? (keys === "Ctrl+Y" ? byId("redo") : undefined);
    if (!command || isTyped(event, keys) || command.isPossible?.() === false) return;
    event.preventDefault();
    run(command);
  });
  takeDrops(skeleton.root, (file) => attempt(() => files.open(file)));
  dragSide(skeleton.side, page);
  showPlots(skeleton.plots, page, attempt);
  drawHead();
  followPanel();
  summarise();
  drawFoot();
  grid.focus();

  return {
    progress(next) {
      progress = next;
      drawFoot();
    },
    async resumeDraft() {
      const draft = await page.bench.keptDraft();
      if (!draft) return;
      const { sheet, row, column } = draft.place;
      page.select({ sheet, top: row, left: column, bottom: row, right: column }, draft.place);
      editor.resume(draft.place, draft.text);
      page.announce("What you were typing when the page was closed is here again.");
    },
  };
}

/** Keys that belong to a field while something is typed in it. */
function isTyped(event: KeyboardEvent, keys: string): boolean {
  const target = event.target as HTMLElement;
  const isField = target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName);
  return isField && (/^(Delete|Backspace|F2|Ctrl\+(Z|Y|Shift\+Z|D|A))$/.test(keys) || keys.length === 1);
}
