import { drawCall } from "../../../../call/drawCall.js";
import type { Place } from "../../../../sheet/book/book.js";
import type { Distribution } from "../../protocol/answers.js";
import { bookOfSession, type Session } from "../session.js";
import { formulaHome, tellAt } from "./whyCell.js";

/** The call in a cell for inputs drawn within their uncertainties, beside what first order says. */
export function drawCell(session: Session, place: Place, seed: number): Distribution | undefined {
  const book = bookOfSession(session);
  const home = formulaHome(book, place);
  const told = home && tellAt(book, home, place);
  const drawn = told && drawCall(told.story, seed);
  if (!drawn) return undefined;
  const { result, upper, lower } = told.story;
  const { unit, ...summary } = drawn;
  return {
    place,
    seed,
    ...summary,
    unit: unit === "1" ? "" : unit,
    value: result as number,
    upper: typeof upper === "number" ? upper : 0,
    lower: typeof lower === "number" ? lower : 0,
  };
}
