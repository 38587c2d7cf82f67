/** One that lived this long was well: its end was an accident from outside, and it is started again at once. */
const wellAfterMs = 2_000;
const mostShortLives = 5;
const firstDelayMs = 100;

export type RestartLimit = Readonly<{ nextDelayMs: (livedMs: number) => number | null }>;

/** How long to wait before the next restart; null when one short life followed another too often. */
export function createRestartLimit(): RestartLimit {
  let shortLives = 0;
  return {
    nextDelayMs: (livedMs) => {
      shortLives = livedMs < wellAfterMs ? shortLives + 1 : 0;
      if (shortLives > mostShortLives) return null;
      return shortLives === 0 ? 0 : firstDelayMs * 2 ** (shortLives - 1);
    },
  };
}
