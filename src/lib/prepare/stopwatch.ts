/** Milliseconds by name, added up over all calls. They stand beside a result, never in it. */
export interface Stopwatch {
  readonly milliseconds: Record<string, number>;
  time<T>(name: string, work: () => Promise<T>): Promise<T>;
  timeNow<T>(name: string, work: () => T): T;
}

/**
 * A stopwatch on a steady clock.
 * @param now milliseconds on that clock
 */
export function stopwatch(now: () => number): Stopwatch {
  const milliseconds: Record<string, number> = {};
  const add = (name: string, since: number): void => {
    milliseconds[name] = (milliseconds[name] ?? 0) + now() - since;
  };
  return {
    milliseconds,
    async time(name, work) {
      const since = now();
      try {
        return await work();
      } finally {
        add(name, since);
      }
    },
    timeNow(name, work) {
      const since = now();
      try {
        return work();
      } finally {
        add(name, since);
      }
    },
  };
}
