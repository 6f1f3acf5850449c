import { type Cell, CellError } from "../../../src/call/cell.js";
import { type Block, cellsOf } from "../../../src/call/column.js";
import { type Given, isPlaced } from "../../call/door.js";
import { codeNumbers, type RuntimeAnswer, type RuntimeCall } from "./runtimePage.js";

/** A call of our own tests as the host would send it. */
export function runtimeCall(id: string, given: readonly Given[]): RuntimeCall {
  return {
    id,
    values: given.map((argument) => hostValue(argument)),
    addresses: given.map((argument) => (isPlaced(argument) ? argument.address : null)),
  };
}

function hostValue(given: Given): unknown {
  if (given === undefined) return null;
  const cells = isPlaced(given) ? given.cells : Array.isArray(given) ? (given as Cell[][]) : [[given as Cell]];
  return cells.map((row) => row.map(hostCell));
}

function hostCell(cell: Cell): unknown {
  if (!(cell instanceof CellError)) return cell;
  const { code, message } = cell;
  return { value: JSON.stringify({ type: "Error", basicType: "Error", basicValue: code, message }) };
}

/** What the runtime has to send back for a result of the library. */
export function expectedAnswer(block: Block): RuntimeAnswer {
  const cells = cellsOf(block);
  const [only] = cells[0]!;
  if (cells.length === 1 && cells[0]!.length === 1 && only instanceof CellError && only.code in codeNumbers) {
    return { message: shownMessage(only) ?? "", code: codeNumbers[only.code]! };
  }
  return { value: cells.map((row) => row.map(expectedCell)) };
}

function expectedCell(cell: Cell): unknown {
  if (cell === null) return "";
  return cell instanceof CellError ? { code: cell.code, message: shownMessage(cell) } : cell;
}

/** A host shows the sentence of these two codes alone. */
function shownMessage({ code, message }: CellError): string | undefined {
  return code === "#VALUE!" || code === "#N/A" ? message : undefined;
}

/** An answer of the runtime with its errors reduced to code and sentence. */
export function plainAnswer(answer: RuntimeAnswer): RuntimeAnswer {
  if (!("value" in answer)) return answer;
  const plain = (cell: unknown) =>
    typeof cell === "object" && cell !== null
      ? { code: (cell as CellError).code, message: (cell as CellError).message }
      : cell;
  return { value: (answer.value as unknown[][]).map((row) => row.map(plain)) };
}
