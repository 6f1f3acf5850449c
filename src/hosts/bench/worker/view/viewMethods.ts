import { EditRefused } from "../../../../sheet/edit/refused.js";
import type { Bench } from "../../protocol/bench.js";
import type { Outcome } from "../../protocol/request.js";
import type { Service } from "../service.js";
import { bookOfSession, type Session } from "../session.js";
import type { SessionHolder } from "../sessionHolder.js";
import { edge } from "./edge.js";
import { entryText } from "./entryText.js";
import { find, nextProblem } from "./find.js";
import { placeOf } from "./placeOf.js";
import { filterSheet } from "./sheetFilters.js";
import { summarise } from "./summarise.js";
import { windowOf } from "./windowOf.js";

export type ViewMethods = Service<
  Pick<
    Bench,
    "windowOf" | "visibleRows" | "entryOf" | "summarise" | "filter" | "find" | "edge" | "placeOf" | "nextProblem"
  >
>;

/** Ways of looking at the open book; none of them is an edit. */
export function viewMethods(holder: SessionHolder): ViewMethods {
  const book = () => bookOfSession(holder.session());
  return {
    windowOf: (sheet, from, to, left, right) => windowOf(holder.session(), sheet, from, to, left, right),
    visibleRows: (sheet) => holder.session().filters[sheet]?.rows.slice(),
    entryOf: (place) => entryText(book(), place),
    summarise: (area) => summarise(holder.session(), area),
    filter(sheet, conditions, rows): Outcome {
      const session = holder.session();
      try {
        const filters = [...session.filters];
        filters[sheet] = filterSheet(bookOfSession(session), sheet, conditions, rows);
        holder.replace(withFilters(session, filters));
        return { is: "done" };
      } catch (thrown) {
        if (thrown instanceof EditRefused) return { is: "refused", message: thrown.message };
        throw thrown;
      }
    },
    find: (options, after, backwards) => find(holder.session(), options, after, backwards),
    edge: (place, toward) => edge(holder.session(), place, toward),
    placeOf: (text, sheet) => placeOf(book(), text, sheet),
    nextProblem: (after) => nextProblem(holder.session(), after),
  };
}

function withFilters(session: Session, filters: Session["filters"]): Session {
  return { ...session, version: session.version + 1, filters };
}
