/*
 * Writes the frozen log that has to replay for ever: node --import tsx tests/support/freeze-log.ts NAME.
 * Run once for a release. It never writes over a log that stands: a fixture that changes proves nothing.
 */
import { existsSync, mkdirSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { everyKindCase } from '@/tests/lib/case/every-kind';
import { replayedFacts } from '@/tests/lib/case/replayed-facts';

const name = process.argv[2] ?? '';
if (!/^frozen-log-[1-9][0-9]*$/.test(name)) throw new Error(`Name ${name || 'missing'}: frozen-log-1, frozen-log-2 and so on is allowed`);
const folder = path.resolve(import.meta.dirname, '../lib/case/fixtures');
const file = path.join(folder, `${name}.json`);
if (existsSync(file)) throw new Error(`${name} stands already: a frozen log is never written again`);
mkdirSync(folder, { recursive: true });
const { entries } = everyKindCase();
// One entry a line, so that a person can read and compare it.
const lines = entries.map((entry) => JSON.stringify(entry)).join(',\n');
writeFileSync(file, `{"facts": ${JSON.stringify(replayedFacts(entries))},\n"entries": [\n${lines}\n]}\n`);
process.stdout.write(`${entries.length} entries\n`);
