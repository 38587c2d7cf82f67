-- Roles of the program. They belong to the whole server, not to one database, so this is run again for each database
-- and changes nothing that is right. No passwords here: the set-up gives them.
do $roles$
declare
  wanted text;
  found record;
begin
  foreach wanted in array array['fascicle_owner', 'fascicle_app', 'fascicle_feed', 'fascicle_audit', 'fascicle_migrate'] loop
    begin
      if not exists (select from pg_catalog.pg_roles where rolname = wanted) then
        execute format('create role %I nosuperuser nocreatedb nocreaterole noreplication nobypassrls inherit %s',
          wanted, case wanted when 'fascicle_owner' then 'nologin' else 'login' end);
      end if;
    exception when duplicate_object or unique_violation then
      null; -- another database of this server was being set up at the same moment
    end;
    select rolsuper, rolbypassrls, rolcanlogin into found from pg_catalog.pg_roles where rolname = wanted;
    if found.rolsuper or found.rolbypassrls then
      raise exception 'Role % may pass row-level security; it must be neither superuser nor bypassrls.', wanted;
    end if;
    if wanted = 'fascicle_owner' and found.rolcanlogin then
      raise exception 'Role fascicle_owner can log in; it must be nologin.';
    end if;
  end loop;
  -- The role that migrates becomes the owner for the length of a migration; nobody else can. A superuser needs no grant.
  foreach wanted in array array['fascicle_migrate', current_user] loop
    begin
      if not exists (select from pg_catalog.pg_roles where rolname = wanted and rolsuper) then
        execute format('grant fascicle_owner to %I', wanted);
      end if;
    exception when unique_violation or internal_error then
      null; -- as above: both write the same row
    end;
  end loop;
end
$roles$;
