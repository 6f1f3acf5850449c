/** Things that depend on each other in circles, and all others one by one; what is read before what reads it. */
export function components<T>(things: readonly T[], readersOf: (thing: T) => Iterable<T>): T[][] {
  const index = new Map<T, number>();
  const low = new Map<T, number>();
  const onStack = new Set<T>();
  const stack: T[] = [];
  const found: T[][] = [];

  const open = (thing: T): Frame<T> => {
    index.set(thing, index.size);
    low.set(thing, index.get(thing) as number);
    stack.push(thing);
    onStack.add(thing);
    return { thing, readers: readersOf(thing)[Symbol.iterator]() };
  };
  const close = (thing: T): void => {
    if (low.get(thing) !== index.get(thing)) {
      return;
    }
    const members: T[] = [];
    for (let member = stack.pop() as T; ; member = stack.pop() as T) {
      onStack.delete(member);
      members.push(member);
      if (member === thing) {
        break;
      }
    }
    found.push(members);
  };

  // An explicit stack of frames: chains are deeper than the stack of the machine.
  for (const start of things) {
    const frames = index.has(start) ? [] : [open(start)];
    for (let frame = frames.at(-1); frame !== undefined; frame = frames.at(-1)) {
      const next = frame.readers.next();
      if (next.done) {
        close(frame.thing);
        frames.pop();
        lower(low, frames.at(-1)?.thing, low.get(frame.thing));
      } else if (!index.has(next.value)) {
        frames.push(open(next.value));
      } else if (onStack.has(next.value)) {
        lower(low, frame.thing, index.get(next.value));
      }
    }
  }
  return found.reverse();
}

interface Frame<T> {
  readonly thing: T;
  readonly readers: Iterator<T>;
}

function lower<T>(low: Map<T, number>, thing: T | undefined, to: number | undefined): void {
  if (thing !== undefined && to !== undefined && to < (low.get(thing) as number)) {
    low.set(thing, to);
  }
}
