import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { type LiteralPiece, literalPieces, packPiece, packRuns } from "../../../../files/bookFile/packedColumn.js";
import type { Book, SheetColumn } from "../../../../sheet/book/book.js";
import { usedRows } from "../../../../sheet/book/usedRows.js";
import { formulaText } from "../../../../sheet/formula/formula.js";
import {
  type BookRecord,
  bookRecordFormat,
  type ColumnPart,
  type Database,
  type Part,
  type PiecePlace,
} from "./database.js";
import { packMark } from "./packedMark.js";

/** What of an object is stored, and under which number. */
interface Stored {
  readonly part: number;
  /** What else the part depends on besides the object. */
  readonly condition: string;
  /** Parts that this one names. */
  readonly named: readonly number[];
}

/** Saves one book, again and again; only what it has not saved before is written. */
export interface BookKeeper {
  /** Resolves when all of it is stored, in one transaction; rejects when nothing of it is. */
  save(document: BookDocument, now: number): Promise<void>;
  /** Tells which chunks of a book that was loaded are stored already. */
  loaded(book: Book, columns: readonly (readonly (ColumnPart | undefined)[])[]): void;
}

/** Labels of the history that are kept. */
const mostLabels = 200;

/** A keeper of the book under `id`; `record` is what is stored of it so far. */
export function createBookKeeper(
  database: Database,
  id: string,
  record?: BookRecord,
  parts?: Iterable<number>,
): BookKeeper {
  // Parts never change, and versions of a book share what did not change: an object that is stored need not be again.
  let stored = new WeakMap<object, Stored>();
  let live = new Set(parts);
  let next = record?.next ?? 1;

  async function save(document: BookDocument, now: number): Promise<void> {
    const { title, book, presentation, marks, revisions, history } = document;
    const writes = new Map<number, Part>();
    const fresh: [object, Stored][] = [];
    const used = new Set<number>();

    const keep = (object: object, condition: string, make: () => [Part, readonly number[]]): number => {
      const known = stored.get(object);
      if (known?.condition === condition && live.has(known.part)) {
        for (const part of [known.part, ...known.named]) used.add(part);
        return known.part;
      }
      const [content, named] = make();
      const part = next++;
      writes.set(part, content);
      used.add(part);
      fresh.push([object, { part, condition, named }]);
      return part;
    };
    const keepPiece = (piece: LiteralPiece): PiecePlace => {
      const spans = spansText(piece);
      const part = keep(piece.chunk, spans, () => [{ is: "cells", cells: packPiece(piece) }, []]);
      return { start: piece.start, length: piece.chunk.length, spans, part };
    };
    const keepColumn = (column: SheetColumn, index: number): number => {
      if (column.cells.length === 0 && column.runs.length === 0) return 0;
      return keep(column, String(index), () => {
        const pieces = literalPieces(column).map(keepPiece);
        const runs = packRuns(column.runs, index);
        return [{ is: "column", column: { pieces, runs } }, pieces.map(({ part }) => part)];
      });
    };

    const written: BookRecord = {
      id,
      format: bookRecordFormat,
      title,
      changed: now,
      rows: book.sheets.reduce((most, _, sheet) => Math.max(most, usedRows(book, sheet)), 0),
      removed: undefined,
      sheets: book.sheets.map(({ name, columns }) => ({ name, columns: columns.map(keepColumn) })),
      names: book.names.map(({ name, formula }) => ({ name, refersTo: formulaText(formula, 0, 0) })),
      presentation,
      marks: marks.map((mark) => keep(mark, "", () => [{ is: "mark", mark: packMark(mark) }, []])),
      ...(revisions && {
        revisions: {
          ...revisions,
          ledgers: revisions.ledgers.map((ledger) => keep(ledger, "", () => [{ is: "ledger", ledger }, []])),
        },
      }),
      history: history.slice(-mostLabels),
      next,
    };
    const gone = [...live].filter((part) => !used.has(part));
    await write(database, written, writes, gone);
    for (const [object, what] of fresh) stored.set(object, what);
    live = used;
  }

  return {
    save,
    loaded(book, columns) {
      stored = new WeakMap();
      for (const [sheet, { columns: own }] of book.sheets.entries()) {
        for (const [index, column] of own.entries()) {
          const known = columns[sheet]?.[index]?.pieces ?? [];
          const places = new Map(known.map((place) => [place.start, place]));
          for (const piece of literalPieces(column)) {
            const place = places.get(piece.start);
            if (place?.length !== piece.chunk.length || place.spans !== spansText(piece)) continue;
            stored.set(piece.chunk, { part: place.part, condition: place.spans, named: [] });
          }
        }
      }
    },
  };
}

async function write(
  database: Database,
  record: BookRecord,
  writes: ReadonlyMap<number, Part>,
  gone: readonly number[],
): Promise<void> {
  const transaction = database.transaction(["books", "parts", "settings"], "readwrite", { durability: "strict" });
  const parts = transaction.objectStore("parts");
  const requests = [
    ...[...writes].map(([number, part]) => parts.put(part, [record.id, number])),
    ...gone.map((number) => parts.delete([record.id, number])),
    transaction.objectStore("books").put(record),
    transaction.objectStore("settings").put(record.id, "last book"),
  ];
  await Promise.all([...requests, transaction.done]);
}

function spansText({ spans }: LiteralPiece): string {
  return spans.map(({ from, to }) => `${from}-${to}`).join(" ");
}
