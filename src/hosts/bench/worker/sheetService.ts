import type { Bench } from "../protocol/bench.js";
import { actions } from "./actions/queue.js";
import { formulaMethods } from "./formulas/formulaMethods.js";
import { planMethods } from "./plan/planMethods.js";
import { loadReviseMethods } from "./revise/loadReviseMethods.js";
import type { Service } from "./service.js";
import type { SessionHolder } from "./sessionHolder.js";
import { tableMethods } from "./tables/tableMethods.js";
import { tellMethods } from "./tell/tellMethods.js";
import { viewMethods } from "./view/viewMethods.js";

/** The methods of the bench that are about the open book. */
export type SheetMethods = Omit<
  Bench,
  | "start"
  | "books"
  | "openBook"
  | "newBook"
  | "openDemo"
  | "renameBook"
  | "removeBook"
  | "takeBack"
  | "openFile"
  | "openText"
  | "exportAs"
  | "keepDraft"
  | "keptDraft"
>;

/**
 * What the worker does with the open book. Actions are carried out one after the other; each puts a whole session in
 * the place of the one before, or leaves it as it is.
 */
export function sheetService(holder: SessionHolder): Service<SheetMethods> {
  const queue = actions(holder);
  const plans = planMethods(holder, queue);
  const revisions = loadReviseMethods(holder, queue);
  return {
    ...queue.methods,
    ...viewMethods(holder),
    ...formulaMethods(holder),
    ...tellMethods(holder),
    ...tableMethods(holder, queue),
    ...plans,
    ...revisions.methods,
    cancel() {
      queue.methods.cancel();
      plans.cancel();
      revisions.cancel();
    },
  };
}
