import { join } from 'node:path';

import { ESLint } from 'eslint';
import { beforeAll, describe, expect, it } from 'vitest';

/** Text that each rule must refuse, as if it stood in that file. */
const badTexts: readonly (readonly [string, string, string, string])[] = [
  ['a clock in lib', 'lib/units/round-to.ts', 'export const now = () => Date.now();', 'no-restricted-syntax'],
  ['a hidden clock in lib', 'lib/units/round-to.ts', 'export const now = () => new Date();', 'no-restricted-syntax'],
  ['dice in lib', 'lib/units/round-to.ts', 'export const roll = () => Math.random();', 'no-restricted-syntax'],
  ['the place of the machine in lib', 'lib/units/round-to.ts', 'export const hour = (at: Date) => at.getHours();', 'no-restricted-syntax'],
  ['printing in lib', 'lib/units/round-to.ts', "console.log('x');", 'no-restricted-globals'],
  ['the process in lib', 'lib/units/round-to.ts', 'export const url = process.env.URL;', 'no-restricted-globals'],
  ['surroundings in lib', 'lib/units/round-to.ts', 'export const all = globalThis;', 'no-restricted-globals'],
  ['a timer in lib', 'lib/units/round-to.ts', 'setTimeout(() => undefined, 1);', 'no-restricted-globals'],
  ['any', 'lib/units/round-to.ts', 'export const value = (x: any) => x;', '@typescript-eslint/no-explicit-any'],
  ['a forgotten promise', 'db/connection.ts', 'async function save() { await Promise.resolve(); }\nsave();', '@typescript-eslint/no-floating-promises'],
  ['a silenced compiler', 'db/connection.ts', `// @ts-igno${'re'}\nexport const x: string = 1;`, '@typescript-eslint/ban-ts-comment'],
  ['a path upwards', 'db/connection.ts', "import '../lib/units/round-to';", 'no-restricted-imports'],
  ['printing in the server', 'db/connection.ts', "console.log('x');", 'no-console'],
  ['a missing case', 'lib/units/round-to.ts', "export function f(x: 'a' | 'b') { switch (x) { case 'a': return 1; } return 2; }", '@typescript-eslint/switch-exhaustiveness-check'],
];

const eslint = new ESLint({ overrideConfigFile: join(import.meta.dirname, 'eslint.config.mjs') });
const rulesBroken = async (path: string, text: string): Promise<readonly (string | null)[]> => {
  const [report] = await eslint.lintText(text, { filePath: path });
  return (report?.messages ?? []).map((message) => message.ruleId);
};

describe('the lint', () => {
  beforeAll(() => rulesBroken('lib/units/round-to.ts', ''), 60_000);

  it.each(badTexts)('refuses %s', async (_what, path, text, rule) => {
    expect(await rulesBroken(path, text)).toContain(rule);
  });

  it('lets a moment that is given pass in lib', async () => {
    const text = 'export const iso = (ms: number) => new Date(ms).toISOString();\n';
    expect(await rulesBroken('lib/units/round-to.ts', text)).toEqual([]);
  });

  it('does not obey a comment that switches it off', async () => {
    const text = `/* eslint-disa${'ble'} */\nexport const roll = () => Math.random();\n`;
    expect(await rulesBroken('lib/units/round-to.ts', text)).toContain('no-restricted-syntax');
  });
});
