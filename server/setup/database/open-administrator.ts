import { Client } from 'pg';
import { SetupFailure } from '../setup-failure.mjs';
import { hasCode } from './answers-queries';

/** Connects as the administrator, creating the database of the address when the server has none of that name. */
export async function openAdministrator(adminUrl: string): Promise<Client> {
  try {
    return await connect(adminUrl);
  } catch (error) {
    if (!hasCode(error) || error.code !== '3D000') throw unreachable(adminUrl, error);
  }
  const elsewhere = new URL(adminUrl);
  const name = decodeURIComponent(elsewhere.pathname.slice(1));
  elsewhere.pathname = '/postgres';
  const client = await connect(elsewhere.href).catch((error: unknown) => {
    throw unreachable(elsewhere.href, error);
  });
  try {
    await client.query(`create database ${client.escapeIdentifier(name)} encoding 'UTF8' template template0`);
  } catch (error) {
    throw new SetupFailure('missingRight', `The database "${name}" does not exist and this user may not create it (${sentencePart(error)}).`, error);
  } finally {
    await client.end();
  }
  return connect(adminUrl);
}

async function connect(url: string): Promise<Client> {
  const client = new Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  client.on('error', () => undefined);
  try {
    await client.connect();
    return client;
  } catch (error) {
    await client.end().catch(() => undefined);
    throw error;
  }
}

function unreachable(url: string, error: unknown): SetupFailure {
  const { hostname, port } = new URL(url);
  return new SetupFailure('database', `The database at ${hostname}:${port || 5432} cannot be used: ${sentencePart(error)}.`, error);
}

/** A refused connection to a name with two addresses carries its reasons inside. */
function sentencePart(error: unknown): string {
  const first: unknown = error instanceof AggregateError ? error.errors[0] : error;
  return first instanceof Error ? first.message : String(first);
}
