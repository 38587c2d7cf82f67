import { randomBytes } from 'node:crypto';
import { Client } from 'pg';
import { roleAddresses, type DatabaseAddresses } from '@/server/setup/database/prepare-database';
import { databaseAddress, templateName, testSecret, type TemplateKind } from './template-database';

export type TestDatabase = DatabaseAddresses & Readonly<{ name: string; adminUrl: string; secret: string; drop: () => Promise<void> }>;

/** A database of one test's own, copied from the migrated template; `demo` has the demo hospitals and people in it. */
export async function createTestDatabase(kind: TemplateKind = 'empty', clusterUrl = testAdminUrl()): Promise<TestDatabase> {
  const name = `test_${randomBytes(6).toString('hex')}`;
  await onCluster(clusterUrl, `create database ${name} template ${templateName(kind)}`);
  const adminUrl = databaseAddress(clusterUrl, name);
  const addresses = roleAddresses({ adminUrl, secret: testSecret });
  return { name, adminUrl, secret: testSecret, ...addresses, drop: () => onCluster(clusterUrl, `drop database if exists ${name} with (force)`) };
}

/** The administrator's address of the throw-away cluster; `npm test` and the global set-up give it. */
export function testAdminUrl(): string {
  const url = process.env.FASCICLE_TEST_ADMIN_URL;
  if (url === undefined) throw new Error('FASCICLE_TEST_ADMIN_URL is not set; run the test in a project with the global database.');
  return url;
}

async function onCluster(clusterUrl: string, statement: string): Promise<void> {
  const client = new Client({ connectionString: clusterUrl });
  await client.connect();
  try {
    await client.query(statement);
  } finally {
    await client.end();
  }
}
