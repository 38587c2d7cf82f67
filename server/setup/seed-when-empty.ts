import { makePool } from '@/db/connection';
import { isEmptyDatabase } from '@/db/seeds/is-empty-database';
import { seedDemo } from '@/db/seeds/seed-demo';

/** Writes the demo hospitals and people into a database that holds nobody yet. */
export async function seedWhenEmpty(adminUrl: string): Promise<string> {
  const admin = makePool(adminUrl, 2, 'fascicle demo');
  try {
    if (!(await isEmptyDatabase(admin))) return 'there already';
    await seedDemo(admin);
    return 'written';
  } finally {
    await admin.destroy();
  }
}
