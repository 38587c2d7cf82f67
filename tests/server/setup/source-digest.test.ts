import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeEach, expect, it } from 'vitest';
import { sourceDigest } from '@/server/setup/source-digest';

const root = mkdtempSync(path.join(os.tmpdir(), 'fascicle-sources-'));
let before: string;

beforeEach(() => {
  rmSync(root, { recursive: true, force: true });
  mkdirSync(path.join(root, 'lib/units'), { recursive: true });
  writeFileSync(path.join(root, 'lib/units/a.ts'), 'one');
  writeFileSync(path.join(root, 'package-lock.json'), '{}');
  before = sourceDigest(root);
});
afterAll(() => rmSync(root, { recursive: true, force: true }));

it.each([
  ['another byte', () => writeFileSync(path.join(root, 'lib/units/a.ts'), 'two')],
  ['another name', () => renameSync(path.join(root, 'lib/units/a.ts'), path.join(root, 'lib/units/b.ts'))],
  ['one more file', () => writeFileSync(path.join(root, 'lib/c.ts'), '')],
  ['another lock file', () => writeFileSync(path.join(root, 'package-lock.json'), '{ }')],
])('sourceDigest changes with %s', (_what, change) => {
  change();
  expect(sourceDigest(root)).not.toBe(before);
});

it('sourceDigest does not change with what the product is not made of', () => {
  writeFileSync(path.join(root, 'README.md'), 'read me');
  expect(sourceDigest(root)).toBe(before);
});
