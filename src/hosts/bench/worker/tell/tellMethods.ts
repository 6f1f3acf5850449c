import type { Bench } from "../../protocol/bench.js";
import type { Service } from "../service.js";
import type { SessionHolder } from "../sessionHolder.js";
import { drawCell } from "./drawCell.js";
import { whyCell } from "./whyCell.js";

export type TellMethods = Service<Pick<Bench, "why" | "draw">>;

/** What tells where a value comes from. */
export function tellMethods(holder: SessionHolder): TellMethods {
  return {
    why: (place) => whyCell(holder.session(), place),
    draw: (place, seed) => drawCell(holder.session(), place, seed),
  };
}
