import { completeHeaders } from "../../../../sheet/tell/completeHeaders.js";
import type { Bench } from "../../protocol/bench.js";
import { headerText } from "../actions/words.js";
import type { Service } from "../service.js";
import { bookOfSession } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { checkFormulaAt } from "./checkFormulaAt.js";
import { functionEntries, searchFunctions } from "./functionEntries.js";

export type FormulaMethods = Service<Pick<Bench, "functions" | "searchFunctions" | "checkFormula" | "completeHeaders">>;

/** What helps while a formula is typed. */
export function formulaMethods(holder: SessionHolder): FormulaMethods {
  const book = () => bookOfSession(holder.session());
  return {
    functions: () => functionEntries,
    searchFunctions,
    checkFormula: (text, place) => checkFormulaAt(book(), text, place),
    completeHeaders(text, caret, { sheet, row, column }) {
      const now = book();
      const header = (at: number, named: string | undefined): string => {
        const wanted = named?.toUpperCase();
        const on = wanted === undefined ? sheet : now.sheets.findIndex(({ name }) => name.toUpperCase() === wanted);
        return on < 0 ? "" : headerText(now, on, at);
      };
      return completeHeaders(text, caret, { row, column, header });
    },
  };
}
