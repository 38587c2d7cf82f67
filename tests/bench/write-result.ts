import { execFileSync } from 'node:child_process';
import { appendFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';

import type { Measure, Pairs } from './measure';
import { quantile } from './quantile';

/** The baseline against itself has to lie between these, or the run says nothing. House rule. */
const controlLimits = [0.9, 1.1] as const;
const resultsFile = path.join(import.meta.dirname, 'results.jsonl');

/** Prints and keeps one line for each quantile of a measure. True when the control of the first one, the median, held: rare values need no two halves alike. */
export function writeResults(measure: Measure, pairs: Pairs, facts: { seed: number; load: number; command: string }): boolean {
  const commit = execFileSync('git', ['rev-parse', '--short=12', 'HEAD'], { encoding: 'utf8', cwd: import.meta.dirname }).trim();
  const isDirty = execFileSync('git', ['status', '--porcelain', '--', '../../app', '../../lib', '../../server', '../../db'], { encoding: 'utf8', cwd: import.meta.dirname }).trim() !== '';
  const trusted = Object.entries(measure.shares).map(([end, share]) => {
    const value = quantile(pairs.productMs, share);
    const baseline = quantile(pairs.baselineMs, share);
    const control = controlOf(pairs.baselineMs, share);
    const isTrusted = control >= controlLimits[0] && control <= controlLimits[1];
    const line = {
      measure: `${measure.name}_${end}`, value: round(value), unit: 'ms', n: pairs.productMs.length,
      baseline: round(baseline), ratio: round(value / baseline), control: round(control), isTrusted,
      load: round(facts.load), cpus: os.cpus().length, date: new Date().toISOString(), commit: isDirty ? `${commit}+` : commit, command: facts.command, seed: facts.seed,
    };
    appendFileSync(resultsFile, `${JSON.stringify(line)}\n`);
    process.stdout.write(`${line.measure.padEnd(34)} ${String(line.value).padStart(8)} ms   baseline ${line.baseline} ms   ratio ${line.ratio}   control ${line.control}${isTrusted ? '' : ' (outside 0.9 to 1.1: not trusted)'}   n ${line.n}\n`);
    return isTrusted;
  });
  return trusted[0] === true;
}

/** The same quantile of every other baseline value against that of the rest: two equal things, measured alike. */
function controlOf(values: readonly number[], share: number): number {
  const half = (rest: number) => values.filter((_, index) => index % 2 === rest);
  return quantile(half(0), share) / quantile(half(1), share);
}

function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}
