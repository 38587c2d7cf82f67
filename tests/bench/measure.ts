import type { Browser } from 'playwright-core';
import type { Product } from '@/tests/support/start-product';

/** What a measure may use. */
export interface BenchHouse {
  readonly product: Product;
  readonly browser: Browser;
  readonly seed: number;
}

/** Values of the product and of a bare stand-in for it, taken in turns in the same run. */
export interface Pairs {
  readonly productMs: readonly number[];
  readonly baselineMs: readonly number[];
}

/** One thing that is measured. It gives one result line for each share named. */
export interface Measure {
  readonly name: string;
  /** Quantiles to report, by the end of the measure's name: p50, p99. */
  readonly shares: Readonly<Record<string, number>>;
  readonly run: (house: BenchHouse) => Promise<Pairs>;
}
