import knex from 'knex';
import path from 'node:path';
import type { Settings } from '@/server/settings/settings';

/** Writes the demo people and cases into a database that holds no hospital yet. */
export async function seedWhenEmpty(settings: Settings, adminUrl: string): Promise<string> {
  const database = knex({ client: 'pg', connection: adminUrl, pool: { min: 0, max: 2 } });
  try {
    if ((await database('hospitals').first('id')) !== undefined) return 'there already';
    const file = path.resolve(import.meta.dirname, '../../db/seeds/seed-demo.ts');
    const { seedDemo } = (await import(file)) as { seedDemo: (database: unknown, settings: Settings) => Promise<void> };
    await seedDemo(database, settings);
    return 'written';
  } finally {
    await database.destroy();
  }
}
