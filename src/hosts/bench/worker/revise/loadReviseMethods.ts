import type { ActionQueue } from "../actions/queue.js";
import type { SessionHolder } from "../sessionHolder.js";
import type { ReviseMethods } from "./reviseMethods.js";

type Loaded = ReturnType<typeof import("./reviseMethods.js")["reviseMethods"]>;

/** The methods of revisions, loaded when one of them is first asked for: calculating needs none of them. */
export function loadReviseMethods(
  holder: SessionHolder,
  queue: ActionQueue,
): { readonly methods: ReviseMethods; cancel(): void } {
  let loaded: Loaded | undefined;
  let loading: Promise<Loaded> | undefined;

  function load(): Promise<Loaded> {
    loading ??= import(/* webpackChunkName: "revise" */ "./reviseMethods.js").then(
      ({ reviseMethods }) => {
        loaded = reviseMethods(holder, queue);
        return loaded;
      },
      () => {
        loading = undefined;
        throw new Error(
          "The part of the page that revises tables could not be loaded; start the page's server again (barycell bench) and try once more.",
        );
      },
    );
    return loading;
  }

  return {
    methods: {
      revisionTexts: async (...given) => (await load()).methods.revisionTexts(...given),
      keepRevisionTexts: async (...given) => (await load()).methods.keepRevisionTexts(...given),
      reviseFrom: async (...given) => (await load()).methods.reviseFrom(...given),
      applyRevision: async (...given) => (await load()).methods.applyRevision(...given),
      ledgers: async (...given) => (await load()).methods.ledgers(...given),
      ledger: async (...given) => (await load()).methods.ledger(...given),
      writeLedger: async (...given) => (await load()).methods.writeLedger(...given),
      revisionMoves: async (...given) => (await load()).methods.revisionMoves(...given),
    },
    cancel: () => loaded?.cancel(),
  };
}
