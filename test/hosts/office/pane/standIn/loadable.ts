/** What was asked of the host and is done at the next sync. */
export interface Queue {
  readonly waiting: (() => void)[];
}

/**
 * An object of the host: its properties can be read only after load and sync, as in a real one, so that code which
 * forgets either fails here too. `fetch` gives undefined for a null object.
 */
export function loadable<T extends object>(
  queue: Queue,
  fetch: () => Readonly<Record<string, unknown>> | undefined,
  members: T,
): T & Record<string, unknown> {
  let seen: Record<string, unknown> | undefined;
  const load = (names: string) =>
    queue.waiting.push(() => {
      const all = fetch();
      seen ??= {};
      seen.isNullObject = all === undefined;
      for (const name of names.split(",")) {
        const own = name.trim().replace(/\/.*$/, "");
        if (all) seen[own] = all[own];
      }
    });
  return new Proxy(Object.assign(members, { load }) as T & Record<string, unknown>, {
    get(target, name: string) {
      if (name in target) return (target as Record<string, unknown>)[name];
      if (seen && name in seen) return seen[name];
      throw new Error(`PropertyNotLoaded: ${name} was read before load and sync`);
    },
  });
}
