import type { Knex } from 'knex';
import type { Handle } from './connection';

const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

/**
 * Runs reads and writes in the name of these hospitals, in one transaction; row-level security hides every other row.
 * The setting ends with the transaction, so that the next user of the connection starts with none.
 */
export async function withinHospitals<Result>(
  handle: Handle,
  hospitalIds: readonly string[],
  work: (transaction: Knex.Transaction) => Promise<Result>,
): Promise<Result> {
  const wrong = hospitalIds.find((id) => !uuid.test(id));
  if (wrong !== undefined) throw new RangeError(`Hospital id is ${JSON.stringify(wrong)}; a UUID in lower case is allowed.`);
  return handle.transaction(async (transaction) => {
    await transaction.raw(`select set_config('app.hospitals', ?, true)`, [hospitalIds.join(',')]);
    return work(transaction);
  });
}
