import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = path.resolve(import.meta.dirname, '..');
const strictConsole = 'tests/support/strict-console.ts';
const database = 'tests/support/global-database.ts';
const build = 'tests/support/global-build.ts';

/** Levels that need nothing but Node. */
const pure = ['architecture', 'lib', 'reference'].map((name) => ({
  extends: true as const,
  test: { name, environment: 'node', include: [`tests/${name}/**/*.test.ts`], setupFiles: [strictConsole], testTimeout: 60_000, isolate: name === 'architecture' },
}));

/** Parts of pages, in an imitated browser. */
const pages = {
  extends: true as const,
  test: { name: 'app', environment: 'jsdom', include: ['tests/app/**/*.test.{ts,tsx}'], setupFiles: [strictConsole] },
};

/** Levels on a real PostgreSQL. */
const databases = ['db', 'server'].map((name) => ({
  extends: true as const,
  test: { name, environment: 'node', include: [`tests/${name}/**/*.test.ts`], setupFiles: [strictConsole], globalSetup: [database], testTimeout: 30_000, hookTimeout: 60_000 },
}));

/** Levels on the production build; one file after the other, because each measures time. */
const products = ['live', 'faults', 'e2e'].map((name) => ({
  extends: true as const,
  test: { name, environment: 'node', include: [`tests/${name}/**/*.test.ts`], globalSetup: [database, build], fileParallelism: false, testTimeout: 180_000, hookTimeout: 180_000 },
}));

export default defineConfig({
  root,
  cacheDir: path.join(root, 'tests/.out/vite'),
  resolve: { tsconfigPaths: true },
  test: { pool: 'forks', passWithNoTests: true, projects: [...pure, pages, ...databases, ...products] },
});
