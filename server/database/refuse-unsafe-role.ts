import type { DataSource } from 'typeorm';

/** Tables that hold nothing of anybody: the list of migrations. */
const NOBODYS = ['migrations'];

const UNSAFE = `
  select 'signs in as a superuser, or as a role that row-level security does not bind' as what
    from pg_roles where rolname in (current_user, session_user) and (rolsuper or rolbypassrls)
  union all
  select format('signs in as somebody who owns, or may become the owner of, the table %s', relname)
    from pg_class join pg_namespace on pg_namespace.oid = relnamespace
    where nspname = 'public' and relkind in ('r', 'p') and pg_has_role(current_user, relowner, 'member')
  union all
  select format('finds the table %s without forced row-level security', relname)
    from pg_class join pg_namespace on pg_namespace.oid = relnamespace
    where nspname = 'public' and relkind in ('r', 'p') and not (relrowsecurity and relforcerowsecurity) and relname <> all($1)`;

/**
 * The second lock holds only for a role that it binds, on tables where it is on.
 * @throws Error that says everything that is unsafe
 */
export async function refuseUnsafeRole(source: DataSource): Promise<void> {
  const rows: { what: string }[] = await source.query(UNSAFE, [NOBODYS]);
  if (rows.length === 0) return;
  const reasons = [...new Set(rows.map((row) => row.what))];
  throw new Error(`The server will not start: it ${reasons.join('; it ')}.`);
}
