import type { Cell } from "../../../../src/call/cell.js";
import { columnOf } from "../../../../src/call/column.js";
import type { BenchEvent } from "../../../../src/hosts/bench/protocol/bench.js";
import type { BookState } from "../../../../src/hosts/bench/protocol/bookState.js";
import type { Action, Outcome } from "../../../../src/hosts/bench/protocol/request.js";
import { bookOfSession, openSession, type Session } from "../../../../src/hosts/bench/worker/session.js";
import { type SheetMethods, sheetService } from "../../../../src/hosts/bench/worker/sheetService.js";
import { stateOf } from "../../../../src/hosts/bench/worker/state/stateOf.js";
import { readAddress } from "../../../../src/sheet/book/address.js";
import type { Area, Book, Place } from "../../../../src/sheet/book/book.js";
import { bookOf } from "../../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../../src/sheet/book/cellOf.js";

export function at(address: string, sheet = 0): Place {
  return { sheet, ...readAddress(address)! };
}

export function area(text: string, sheet = 0): Area {
  const [first, last = first] = text.split(":") as [string, string?];
  const [from, to] = [readAddress(first)!, readAddress(last)!];
  return { sheet, top: from.row, left: from.column, bottom: to.row, right: to.column };
}

/** A session in memory over the worker's own service. */
export interface OpenTable {
  readonly service: Omit<SheetMethods, "act"> & { act(action: Action, label?: string): Promise<Outcome> };
  readonly events: BenchEvent[];
  session(): Session;
  book(): Book;
  state(): BookState;
  cell(address: string, sheet?: number): Cell;
  /** Types texts row by row at an address. */
  type(address: string, texts: readonly (readonly string[])[]): Promise<Outcome>;
}

/** Opens a table of rows, the headers first. */
export function openTable(rows: readonly (readonly Cell[])[], name = "Targets"): OpenTable {
  const columns = rows[0]!.map((_, column) => columnOf(rows.map((row) => row[column] ?? null)));
  return openBook(bookOf([{ name, columns }]));
}

export function openBook(book: Book): OpenTable {
  let session = openSession({ id: "test", title: "Test", book });
  const events: BenchEvent[] = [];
  const holder = {
    session: () => session,
    replace(next: Session) {
      session = next;
    },
    emit: (event: BenchEvent) => void events.push(event),
  };
  const service = sheetService(holder) as unknown as OpenTable["service"];
  return {
    service,
    events,
    session: () => session,
    book: () => bookOfSession(session),
    state: () => stateOf(session, { is: "saved", at: 0 }),
    cell: (address, sheet = 0) => cellOf(bookOfSession(session), at(address, sheet)),
    type: (address, texts) => service.act({ do: "type", place: at(address), texts }),
  };
}
