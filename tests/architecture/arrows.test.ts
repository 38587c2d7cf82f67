import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

import type { IConfiguration, ICruiseResult } from 'dependency-cruiser';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const { forbidden = [] } = createRequire(import.meta.url)('./dependency-cruiser.cjs') as IConfiguration;
const ruleNames = forbidden.map((rule) => rule.name ?? '');

/** One import that each rule must catch: file, then what it imports. */
const badImports: Readonly<Record<string, readonly [string, string]>> = {
  'lib-units-knows-no-higher-layer': ['lib/units/bad.ts', '@/lib/case/target'],
  'lib-signal-knows-no-higher-layer': ['lib/signal/bad.ts', '@/lib/response/target'],
  'lib-response-knows-no-higher-layer': ['lib/response/bad.ts', '@/lib/alert/target'],
  'lib-conduction-knows-no-higher-layer': ['lib/conduction/bad.ts', '@/lib/change/target'],
  'lib-change-knows-no-higher-layer': ['lib/change/bad.ts', '@/lib/alert/target'],
  'lib-alert-knows-no-higher-layer': ['lib/alert/bad.ts', '@/lib/case/target'],
  'lib-is-below-everything': ['lib/text/bad.ts', '@/db/target'],
  'lib-does-no-input-or-output': ['lib/text/bad-core.ts', 'node:fs'],
  'lib-uses-three-packages': ['lib/text/bad-package.ts', 'pino'],
  'lib-science-knows-no-wire': ['lib/change/bad-wire.ts', '@/lib/contracts/target'],
  'lib-science-has-no-words-for-people': ['lib/alert/bad-words.ts', '@/lib/text/target'],
  'lib-reference-rows-are-ground': ['lib/reference/bad.ts', '@/lib/case/target'],
  'lib-science-knows-no-templates': ['lib/case/bad-template.ts', '@/lib/reference/templates/target'],
  'lib-record-knows-no-case': ['lib/record/bad.ts', '@/lib/case/target'],
  'zod-only-at-the-doors': ['lib/case/bad-zod.ts', 'zod'],
  'socket-io-only-in-server-live': ['server/http/bad-socket.ts', 'socket.io'],
  'socket-io-client-only-in-app-live': ['app/_features/log/bad-socket.tsx', 'socket.io-client'],
  'sql-only-in-db': ['server/commands/bad-sql.ts', 'pg'],
  'react-only-in-app': ['server/http/bad-react.ts', 'react'],
  'no-server-only-package': ['server/http/bad-server-only.ts', 'server-only'],
  'no-development-package-in-the-product': ['server/http/bad-development.ts', 'vitest'],
  'no-undeclared-package': ['server/http/bad-undeclared.ts', 'postcss'],
  'db-knows-lib-only': ['db/bad.ts', '@/server/commands/target'],
  'server-knows-no-page': ['server/http/bad-page.ts', '@/app/_ui/target'],
  'commands-and-queries-know-no-edge': ['server/commands/bad-edge.ts', '@/server/live/target'],
  'only-commands-and-timers-write': ['server/queries/bad.ts', '@/server/commands/target'],
  'app-knows-no-database': ['app/api/bad/route.ts', '@/db/target'],
  'browser-code-knows-lib-only': ['app/_live/bad.ts', '@/server/commands/target'],
  'browser-code-has-no-node-modules': ['app/_ui/bad-core.tsx', 'node:fs'],
  'features-do-not-know-each-other': ['app/_features/log/bad.tsx', '@/app/_features/plan/target'],
  'shared-parts-know-no-feature': ['app/_ui/bad.tsx', '@/app/_features/plan/target'],
  'primitives-have-no-domain-words': ['app/_ui/bad-words.tsx', '@/lib/case/target'],
  'product-knows-no-test': ['server/http/bad-test.ts', '@/tests/support/target'],
  'no-circle': ['lib/chart/bad-circle-back.ts', '@/lib/chart/bad-circle'],
  'no-unknown-file': ['server/http/bad-path.ts', '@/server/http/nowhere'],
};

const folder = mkdtempSync(join(tmpdir(), 'fascicle-arrows-'));
let caught: ReadonlySet<string> = new Set();

function write(path: string, text: string): void {
  mkdirSync(dirname(join(folder, path)), { recursive: true });
  writeFileSync(join(folder, path), text);
}

/** The very command of the check, run in the folder; it leaves with a status when it finds something. */
function cruised(directory: string): string {
  const program = join(process.cwd(), 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
  const config = join(import.meta.dirname, 'dependency-cruiser.cjs');
  const args = [program, '--config', config, '--output-type', 'json', 'app', 'server', 'lib', 'db'];
  const { stdout, stderr } = spawnSync(process.execPath, args, { cwd: directory, encoding: 'utf8', maxBuffer: 64 * 1024 * 1024 });
  if (stdout === '') throw new Error(`The arrows could not be checked: ${stderr}`);
  return stdout;
}

beforeAll(() => {
  for (const [path, target] of Object.values(badImports)) {
    write(path, `import type { Target } from '${target}';\nexport type Bad = Target;\n`);
    if (target.startsWith('@/') && target.endsWith('target')) write(`${target.slice(2)}.ts`, 'export type Target = 1;\n');
  }
  write('lib/chart/bad-circle.ts', "import type { Bad } from '@/lib/chart/bad-circle-back';\nexport type Target = Bad;\n");
  write('lib/text/bad-orphan.ts', 'export const orphan = 1;\n');
  write('tsconfig.json', JSON.stringify({ compilerOptions: { module: 'esnext', moduleResolution: 'bundler', paths: { '@/*': ['./*'] } } }));
  const dependencies = { zod: '1', pino: '1', pg: '1', react: '1', 'socket.io': '1', 'socket.io-client': '1' };
  write('package.json', JSON.stringify({ name: 'bad', type: 'module', dependencies, devDependencies: { vitest: '1' } }));
  symlinkSync(join(process.cwd(), 'node_modules'), join(folder, 'node_modules'));
  const { summary } = JSON.parse(cruised(folder)) as ICruiseResult;
  caught = new Set(summary.violations.map((violation) => `${violation.rule.name} ${violation.from}`));
});

afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('the arrows', () => {
  it.each(Object.entries(badImports))('%s can fail', (rule, [path]) => {
    expect([...caught]).toContain(`${rule} ${path}`);
  });

  it('lib-has-no-orphans can fail', () => {
    expect([...caught]).toContain('lib-has-no-orphans lib/text/bad-orphan.ts');
  });

  it('leave no rule without its bad import, and give each its reason', () => {
    expect([...ruleNames].sort()).toEqual([...Object.keys(badImports), 'lib-has-no-orphans'].sort());
    expect(forbidden.filter((rule) => (rule.comment ?? '').length < 30)).toEqual([]);
  });
});
