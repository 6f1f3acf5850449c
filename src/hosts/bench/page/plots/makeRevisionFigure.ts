import type { Page } from "../page.js";
import { revisionFigure } from "./figures/revisionFigure.js";
import type { Made } from "./made.js";
import type { PlotSettings } from "./plotSettings.js";

/** Arrows from where a revision found two columns to where it left them. */
export async function makeRevisionFigure(
  page: Page,
  { ledger, x, y, xLog, yLog }: Pick<PlotSettings, "ledger" | "x" | "y" | "xLog" | "yLog">,
): Promise<Made> {
  if (x === "" || y === "") return { missing: "Choose a column for each axis." };
  const moves = await page.bench.revisionMoves(ledger, x, y);
  if (moves.is === "missing") return { missing: moves.message };
  const note = `${moves.file}, ${new Date(moves.date).toLocaleString("sv")}: from the value before to the value after.`;
  return { figure: revisionFigure(moves, xLog, yLog, moves.sheet === page.sheet()), note };
}
