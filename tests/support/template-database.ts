import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { Client } from 'pg';
import { makePool } from '@/db/connection';
import { seedDemo } from '@/db/seeds/seed-demo';
import { migrateDatabase } from '@/server/setup/database/migrate-database';
import { prepareDatabase } from '@/server/setup/database/prepare-database';

export const testSecret = 'a secret of the tests, which guard nothing that is real';
export type TemplateKind = 'empty' | 'demo';

const root = path.resolve(import.meta.dirname, '../..');

/** The name of the migrated database that copies are made of; another name as soon as anything in its making changes. */
export function templateName(kind: TemplateKind): string {
  const digest = createHash('sha256');
  for (const file of readdirSync(path.join(root, 'db'), { recursive: true, encoding: 'utf8' }).sort()) {
    if (/\.(ts|sql)$/.test(file)) digest.update(file).update(readFileSync(path.join(root, 'db', file)));
  }
  return `template_${kind}_${digest.digest('hex').slice(0, 12)}`;
}

/** Makes both templates once per cluster: tables only, and tables with the demo people. */
export async function makeTemplates(adminUrl: string): Promise<void> {
  const client = new Client({ connectionString: adminUrl });
  await client.connect();
  try {
    const exists = async (name: string) => (await client.query('select 1 from pg_database where datname = $1', [name])).rowCount === 1;
    const [empty, demo] = [templateName('empty'), templateName('demo')];
    if (!(await exists(empty))) {
      const making = databaseAddress(adminUrl, `${empty}_making`);
      await client.query(`drop database if exists ${empty}_making`);
      await prepareDatabase({ adminUrl: making, secret: testSecret });
      await migrateDatabase(root, making);
      await client.query(`alter database ${empty}_making rename to ${empty}`);
    }
    if (!(await exists(demo))) {
      await client.query(`drop database if exists ${demo}_making`);
      await client.query(`create database ${demo}_making template ${empty}`);
      const admin = makePool(databaseAddress(adminUrl, `${demo}_making`), 1, 'fascicle test');
      await seedDemo(admin).finally(() => admin.destroy());
      await client.query(`alter database ${demo}_making rename to ${demo}`);
    }
  } finally {
    await client.end();
  }
}

export function databaseAddress(adminUrl: string, name: string): string {
  const url = new URL(adminUrl);
  url.pathname = `/${name}`;
  return url.href;
}
