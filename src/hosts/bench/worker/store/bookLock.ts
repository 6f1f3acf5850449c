/** Lets a book go, so that another tab can have it. */
export type Release = () => void;

/** After the worker of a page was ended, the browser takes a moment to let its books go [ms]. */
const patience = 600;

/** The sole right to save a book; undefined where another tab has it. */
export async function lockBook(id: string): Promise<Release | undefined> {
  return (await request(id, { ifAvailable: true })) ?? request(id, { signal: AbortSignal.timeout(patience) });
}

/** The same, however long the other tab keeps it; undefined once `signal` says that nobody waits any more. */
export function awaitLock(id: string, signal: AbortSignal): Promise<Release | undefined> {
  return request(id, { signal });
}

function request(id: string, options: LockOptions): Promise<Release | undefined> {
  return new Promise((resolve) => {
    navigator.locks
      .request(`barycell book ${id}`, options, (lock) => {
        if (lock === null) {
          resolve(undefined);
          return undefined;
        }
        return new Promise<void>((release) => resolve(release));
      })
      .catch(() => resolve(undefined));
  });
}
