import type { Knex } from 'knex';
import { asOwner } from '@/db/as-owner';

// What strangers can make grow without an account must end by itself. The ages stand here and not in the program: whoever
// has the application's password can hide neither a wall nor the attempts that count against a password guesser.
const up0006 = `
  grant update (succeeded) on sign_in_attempts to fascicle_app;
  create index sign_in_attempts_at on sign_in_attempts (at);
  create index read_audit_screen on read_audit (screen_id) where screen_id is not null;
  create policy owner_reads on read_audit for select to fascicle_owner using (true);
  create policy owner_removes on wall_screens for delete to fascicle_owner using (true);

  create function remove_old_attempts() returns bigint language sql volatile security definer
    set search_path = pg_catalog, pg_temp
    as 'with gone as (delete from public.sign_in_attempts where at < now() - interval ''30 days'' returning 1) select count(*) from gone';

  -- A wall that was bound stays for as long as the audit of reads names it: its row says who let it in.
  create function remove_old_screens() returns bigint language sql volatile security definer
    set search_path = pg_catalog, pg_temp
    as 'with gone as (delete from public.wall_screens s
          where (s.paired_at is null and s.asked_at < now() - interval ''1 day'')
             or (least(s.revoked_at, s.ended_at) < now() - interval ''30 days'' and not exists (select from public.read_audit a where a.screen_id = s.id))
          returning 1)
        select count(*) from gone';
  revoke all on function remove_old_attempts(), remove_old_screens() from public;
  grant execute on function remove_old_attempts(), remove_old_screens() to fascicle_app;
`;

const down0006 = `
  drop function remove_old_screens();
  drop function remove_old_attempts();
  drop policy owner_removes on wall_screens;
  drop policy owner_reads on read_audit;
  drop index read_audit_screen;
  drop index sign_in_attempts_at;
  revoke update (succeeded) on sign_in_attempts from fascicle_app;
`;

export async function up(knex: Knex): Promise<void> {
  await asOwner(knex, up0006);
}

export async function down(knex: Knex): Promise<void> {
  await asOwner(knex, down0006);
}
