// A queue inside the process: so many at a time, the others wait their turn.

export type Queue = <T>(work: () => Promise<T>, signal?: AbortSignal) => Promise<T>;

/** Lets `most` pieces of work run at a time. One whose signal is aborted while it waits is not begun. */
export function createQueue(most: number): Queue {
  let running = 0;
  const waiting: (() => void)[] = [];
  const leave = (): void => {
    running -= 1;
    waiting.shift()?.();
  };
  return async (work, signal) => {
    if (running >= most) await new Promise<void>((resolve) => waiting.push(resolve));
    running += 1;
    try {
      if (signal?.aborted === true) throw new Error('aborted');
      return await work();
    } finally {
      leave();
    }
  };
}
