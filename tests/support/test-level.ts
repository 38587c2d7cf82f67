import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { runProgram } from '@/server/setup/run-program.mjs';
import { root } from './product-build';
import type { Tally } from './tally';
import { tallyReport } from './tally-report';

export type TestLevel = Readonly<{ name: string; run: () => Promise<Tally> }>;

/** A program that is right or wrong as a whole: it counts as one test, and says something only when it is wrong. */
export function programLevel(name: string, programs: readonly (readonly string[])[]): TestLevel {
  return {
    name,
    run: async () => {
      for (const words of programs) {
        const { status, output } = await runProgram(process.execPath, words, { cwd: root });
        if (status === 0) continue;
        process.stdout.write(output);
        return { passed: 0, failed: 1, skipped: 0 };
      }
      return { passed: 1, failed: 0, skipped: 0 };
    },
  };
}

/** Work of our own that counts as one test. */
export function workLevel(name: string, work: () => Promise<unknown>): TestLevel {
  return {
    name,
    run: async () => {
      try {
        await work();
        return { passed: 1, failed: 0, skipped: 0 };
      } catch (error) {
        process.stdout.write(`${error instanceof Error ? error.message : String(error)}\n`);
        return { passed: 0, failed: 1, skipped: 0 };
      }
    },
  };
}

/** One project of the test settings, counted by its report. */
export function vitestLevel(name: string): TestLevel {
  return {
    name,
    run: async () => {
      const report = path.join(root, 'tests/.out/reports', `${name}.json`);
      mkdirSync(path.dirname(report), { recursive: true });
      rmSync(report, { force: true });
      const words = ['node_modules/vitest/vitest.mjs', 'run', '--config', 'tests/vitest.config.ts', '--project', name, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`];
      const { status } = await runProgram(process.execPath, words, { cwd: root, onOutput: (text) => process.stdout.write(text) });
      return tallyReport(existsSync(report) ? readFileSync(report, 'utf8') : null, status);
    },
  };
}
