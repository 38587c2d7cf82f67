import { afterEach, beforeEach } from 'vitest';

/** A test that prints a warning or an error fails: either it is part of what is promised and is caught, or something is wrong. */
const printed: string[] = [];

for (const kind of ['error', 'warn'] as const) {
  console[kind] = (...words: unknown[]) => {
    printed.push(`console.${kind}: ${words.map(String).join(' ')}`);
  };
}

beforeEach(() => {
  printed.length = 0;
});

afterEach(() => {
  if (printed.length > 0) throw new Error(`This test printed what no test may print.\n${printed.join('\n')}`);
});
