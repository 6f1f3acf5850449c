import { html, nothing, type TemplateResult } from "lit-html";
import { columnLetters } from "../../../../../sheet/book/address.js";
import type { ColumnReport, TableReport } from "../../../protocol/answers.js";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { goTo } from "../goTo.js";

/** What was understood of each column of the sheet in view, and what to look at. */
export function checkPanel(page: Page, redraw: () => void): Panel {
  let report: TableReport | undefined;
  let isShown = false;
  let asked = 0;

  function ask(): void {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    page.bench.checkTable(page.sheet()).then(
      (answer) => {
        if (mine !== asked) return;
        report = answer;
        redraw();
      },
      (fault) => page.trouble(faultText(fault)),
    );
  }

  return {
    id: "check",
    title: "Check this table",
    keys: "Alt+K",
    view: () => checkView(page, report),
    shown() {
      isShown = true;
      ask();
    },
    hidden() {
      isShown = false;
    },
    changed(change) {
      if (change === "state" || change === "sheet") ask();
    },
  };
}

function checkView(page: Page, report: TableReport | undefined): TemplateResult {
  if (!report) return html`<p role="status">Looking through the table…</p>`;
  const findings = report.columns.flatMap(({ findings }) => findings).length;
  const errors = report.errors.reduce((sum, { count }) => sum + count, 0);
  return html`<p role="status">${summaryText(report.columns.length, findings, errors)}</p>
    ${
      errors > 0
        ? html`<h3>Cells that could not be worked out</h3>
          <ul class="panel-findings">
            ${merged(report.errors).map(
              ({
                message,
                count,
                first,
              }) => html`<li><button type="button" class="panel-finding" @click=${() => goTo(page, first)}>
                <span class="mark" aria-hidden="true"></span><span>${message}${count > 1 ? html` <b>${count} cells</b>` : nothing}</span>
              </button></li>`,
            )}
          </ul>`
        : nothing
    }
    <h3>Columns</h3>
    <ul class="panel-columns">
      ${report.columns.map((column) => columnView(page, column))}
    </ul>`;
}

/** What fails alike in several columns, as a value and its uncertainty do, is told once. */
function merged(errors: TableReport["errors"]): TableReport["errors"] {
  const bySentence = new Map<string, TableReport["errors"][number]>();
  for (const error of errors) {
    const known = bySentence.get(error.message);
    bySentence.set(error.message, known ? { ...known, count: known.count + error.count } : error);
  }
  return [...bySentence.values()];
}

function columnView(page: Page, { column, header, understood, contents, findings }: ColumnReport): TemplateResult {
  return html`<li>
    <button type="button" class="panel-finding" @click=${() => goTo(page, { sheet: page.sheet(), row: 0, column })}>
      <b>${columnLetters(column)}</b> <span>${header}</span>
    </button>
    <p class="soft">${understood} ${contents}</p>
    ${findings.map(
      ({
        message,
        place,
      }) => html`<button type="button" class="panel-finding" @click=${() => goTo(page, place ?? { sheet: page.sheet(), row: 0, column })}>
        <span class="mark" aria-hidden="true"></span><span>${message}</span>
      </button>`,
    )}
  </li>`;
}

function summaryText(columns: number, findings: number, errors: number): string {
  const of = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;
  const seen =
    findings + errors === 0
      ? "nothing stands out"
      : `${of(findings, "finding", "findings")}, ${of(errors, "cell", "cells")} without an answer`;
  return `${of(columns, "column", "columns")}: ${seen}.`;
}
