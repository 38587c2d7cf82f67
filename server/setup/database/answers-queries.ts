import { Client } from 'pg';

/** Whether a database server takes connections and answers. A wrong password or a missing database is an error, not a no. */
export async function answersQueries(url: string): Promise<boolean> {
  const client = new Client({ connectionString: url, connectionTimeoutMillis: 2_000 });
  client.on('error', () => undefined);
  try {
    await client.connect();
    await client.query('select 1');
    return true;
  } catch (error) {
    if (hasCode(error) && (error.code.startsWith('28') || error.code === '3D000')) throw error;
    return false;
  } finally {
    await client.end().catch(() => undefined);
  }
}

export function hasCode(error: unknown): error is Error & { code: string } {
  return error instanceof Error && 'code' in error && typeof error.code === 'string';
}
