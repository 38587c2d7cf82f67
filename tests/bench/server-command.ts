import { Client } from 'pg';

import { ulnarAtElbow } from '@/lib/reference/templates/ulnar-at-elbow';
import { HttpDesk } from '@/tests/support/http-desk';
import { adm } from '@/tests/support/ulnar-case';

import type { Measure } from './measure';
import { seededDice } from './seeded-dice';

const commandCount = 600;
const warmUpCount = 50;

/** One run judged and appended through the product over HTTP, against one bare INSERT of the same bytes on a connection of its own. */
export const serverCommand: Measure = {
  name: 'server.command_ms',
  shares: { p50: 0.5, p99: 0.99 },
  run: async ({ product, seed }) => {
    const dice = seededDice(seed);
    const desk = await HttpDesk.plan(product, { ...ulnarAtElbow, theatre: 'Theatre 2' });
    await desk.openForBaseline();
    await desk.ulnarBaseline();
    const client = new Client({ connectionString: product.database.adminUrl });
    await client.connect();
    await client.query('create table bare_rows (id bigserial primary key, bytes bytea not null)');
    const productMs: number[] = [];
    const baselineMs: number[] = [];
    let bytes: Buffer = Buffer.from('first');
    const throughProduct = async () => {
      const entries = await desk.run('wrist', { adm: adm('wrist', 0.9 + dice() * 0.15) });
      bytes = Buffer.from(JSON.stringify(entries));
    };
    const bareInsert = () => client.query('insert into bare_rows (bytes) values ($1)', [bytes]);
    for (let round = 0; round < commandCount + warmUpCount; round += 1) {
      const turns = [[throughProduct, productMs], [bareInsert, baselineMs]] as const;
      for (const [act, times] of dice() < 0.5 ? turns : [...turns].reverse()) {
        const begin = performance.now();
        await act();
        if (round >= warmUpCount) times.push(performance.now() - begin);
      }
    }
    await client.end();
    return { productMs, baselineMs };
  },
};
