import { parseArgs } from 'node:util';
import { runLevels } from './run-levels';

/** `npm test`, `npm test -- --full`, and for developers `npm test -- --only lib,db`. */
export function run(words: readonly string[], stop: AbortSignal): Promise<number> {
  const { values } = parseArgs({ args: [...words], options: { full: { type: 'boolean', default: false }, only: { type: 'string', default: '' } } });
  return runLevels({ only: values.only.split(',').filter(Boolean), full: values.full, stop });
}
