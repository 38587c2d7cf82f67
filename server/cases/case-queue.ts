/** Runs work of one key one after another, and of different keys side by side. */
export interface CaseQueue {
  run<Result>(key: string, work: () => Promise<Result>): Promise<Result>;
}

/** One promise queue per case and process: two commands of one case never decide at the same time here. */
export function makeCaseQueue(): CaseQueue {
  const tails = new Map<string, Promise<unknown>>();
  return {
    run(key, work) {
      const result = (tails.get(key) ?? Promise.resolve()).then(work, work);
      const tail = result.catch(() => undefined).then(() => {
        if (tails.get(key) === tail) tails.delete(key);
      });
      tails.set(key, tail);
      return result;
    },
  };
}
