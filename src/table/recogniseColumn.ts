import { angleOf } from "../call/headerUnit.js";
import * as quantities from "../functions/quantities.js";
import type { Quantity } from "../functions/quantity.js";
import { isProblem, type UnitProblem } from "../units/problem.js";
import { readHeader } from "../units/readHeader.js";
import { readUnit } from "../units/readUnit.js";
import type { Unit } from "../units/unit.js";
import { isErrorUcd, quantityOfUcd } from "./ucds.js";

/** What the header of a column was understood to say. */
export interface RecognisedColumn {
  readonly name: string;
  readonly unit: Unit | undefined;
  readonly problem: UnitProblem | undefined;
  /** The quantity of the trade that the name means; undefined where none fits. */
  readonly quantity: Quantity | undefined;
  /** The column holds uncertainties of another. */
  readonly isUncertainty: boolean;
}

// Letters on either side make another word ("terror"); "_" and digits do not: "K_err", "err1".
const uncertaintyWords =
  /(?<!\p{L})(?:sigma|sig|errors?|err|unc|uncertainty|std|stddev)(?!\p{L})[12]?|^e_|[\u00b1\u03c3]|\+\s?\/?\s?-/giu;

/** A header with one of these words tells something about a quantity and is not the quantity itself. */
const aboutAnother =
  /(?<!\p{L})(?:ratio|half|rms|scatter|flag|ref|reference|limit|source|method|number|count|year|date|quality|grade|class|type|name|id)(?!\p{L})/iu;

/**
 * `unitCell`: the cell of a row of units under the header, where the table has one. `ucd`: what the file itself says the
 * column means (IVOA UCD1+); it decides where the name says nothing.
 */
export function recogniseColumn(header: string, unitCell?: string, ucd = ""): RecognisedColumn {
  const reading = readHeader(header);
  const below = unitCell === undefined || unitCell.trim() === "" ? undefined : readUnit(unitCell);
  // "K" alone heads a column of semi-amplitudes rather than one of kelvins.
  const isName = reading.name === "" && quantityNamed(header, undefined) !== undefined;
  const unit = (isName ? undefined : reading.unit) ?? (below && !isProblem(below) ? below : undefined);
  const problem = reading.problem ?? (below && isProblem(below) ? below : undefined);
  const name = reading.name || header.trim();
  const bare = bareName(name);
  const quantity = quantityNamed(bare, unit) ?? quantityOfUcd(ucd, name, unit);
  // An hour of right ascension is no hour of time.
  const own = quantity?.sexagesimal === "hours" ? angleOf(unit) : unit;
  const isUncertainty = bare !== name.trim() || isErrorUcd(ucd);
  return { name, unit: own, problem, quantity, isUncertainty };
}

/** A name without the words that mark an uncertainty: that of the values it belongs to. */
export function bareName(name: string): string {
  return name.replace(uncertaintyWords, " ").trim();
}

interface NamedQuantity {
  readonly words: string;
  readonly quantity: Quantity;
}

const named: readonly NamedQuantity[] = Object.values(quantities).flatMap((quantity) =>
  [quantity.name, quantity.meaning, ...quantity.headers].map((name) => ({ words: plainWords(name), quantity })),
);

/** The quantity whose name stands in a header, the longest name first; one of the unit's kind before any other. */
function quantityNamed(name: string, unit: Unit | undefined): Quantity | undefined {
  const words = plainWords(name);
  const fits = ({ quantity }: NamedQuantity) =>
    unit === undefined || quantity.kind === (quantity.sexagesimal === "hours" ? angleOf(unit).kind : unit.kind);
  const whole = named.filter((candidate) => candidate.words === words);
  const within = aboutAnother.test(name)
    ? []
    : named
        .filter((candidate) => !isVague(candidate.words) && ` ${words} `.includes(` ${candidate.words} `))
        .sort((a, b) => b.words.length - a.words.length);
  const candidates = [...whole, ...within];
  const fitting = candidates.find(fits);
  if (fitting) return fitting.quantity;
  // One letter means many things: "K [mag]" is a brightness and no semi-amplitude with a slip in its unit.
  return candidates.find((candidate) => !isVague(candidate.words))?.quantity;
}

/** A name that heads a column only where it stands alone: an exposure time is no instant. */
function isVague(name: string): boolean {
  return isSymbol(name) || name === "time";
}

export function isSymbol(name: string): boolean {
  return name.length <= 2;
}

/** Letters and digits in words; capitals matter in symbols of one or two letters only (`M` and `m`, `P`, `K`). */
function plainWords(name: string): string {
  const words = name.replace(/[^\p{L}\p{N}*]+/gu, " ").trim();
  return isSymbol(words) ? words : words.toLowerCase();
}
