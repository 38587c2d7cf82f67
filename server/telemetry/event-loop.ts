import { monitorEventLoopDelay } from 'node:perf_hooks';

export type EventLoopDelay = Readonly<{ meanMs: number; p99Ms: number; maxMs: number }>;
export type EventLoopWatch = Readonly<{ read: () => EventLoopDelay; stop: () => void }>;

const resolutionMs = 10;

/** Watches how late the event loop runs its timers; one loop serves every wall, so its delay is theirs. Each read begins a new window. */
export function watchEventLoop(): EventLoopWatch {
  const histogram = monitorEventLoopDelay({ resolution: resolutionMs });
  histogram.enable();
  return {
    read: () => {
      const empty = histogram.count === 0;
      const delay = { meanMs: lateMs(empty ? 0 : histogram.mean), p99Ms: lateMs(histogram.percentile(99)), maxMs: lateMs(empty ? 0 : histogram.max) };
      histogram.reset();
      return delay;
    },
    stop: () => void histogram.disable(),
  };
}

// The histogram holds the time between two samples, the sampling step included.
function lateMs(nanoseconds: number): number {
  return Math.max(0, Math.round((nanoseconds / 1e6 - resolutionMs) * 1000) / 1000);
}
