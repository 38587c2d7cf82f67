import type { Handle } from '@/db/connection';

/** Failures since the last success of that address, and from that machine, within the window. */
export interface Failures {
  readonly byEmail: number;
  readonly byAddress: number;
}

const COUNT = `
  select
    (select count(*) from sign_in_attempts a where a.email_hash = :emailHash and not a.succeeded and a.at > now() - make_interval(secs => :windowS)
      and a.at > coalesce((select max(b.at) from sign_in_attempts b where b.email_hash = :emailHash and b.succeeded), '-infinity')) as by_email,
    (select count(*) from sign_in_attempts a where a.address = :address and not a.succeeded and a.at > now() - make_interval(secs => :windowS)) as by_address`;

/** Counts recent failures, for the throttle of the sign-in. */
export async function countFailures(handle: Handle, emailHash: Uint8Array, address: string, windowS: number): Promise<Failures> {
  const { rows } = await handle.raw<{ rows: { by_email: number; by_address: number }[] }>(COUNT, { emailHash: Buffer.from(emailHash), address, windowS });
  return { byEmail: rows[0]?.by_email ?? 0, byAddress: rows[0]?.by_address ?? 0 };
}
