import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { createDataSource } from '@/server/data-source';
import { freshDatabase, type FreshDatabase } from '../support/fresh-database';

let database: FreshDatabase;
let owner: DataSource;

beforeAll(async () => {
  database = await freshDatabase();
  owner = await createDataSource({
    url: database.ownerUrl,
    logger: pino({ level: 'silent' }),
    patience: 'of-a-migration',
  }).initialize();
});
afterAll(async () => {
  await owner.destroy();
  await database.drop();
});

/** Everything that a migration makes, as text: columns, constraints, indexes, rights, policies, triggers, functions. */
const SHAPE = `
  select format('column %s.%s %s %s %s', table_name, column_name, data_type, is_nullable, column_default) as line
    from information_schema.columns where table_schema = 'public' and table_name <> 'migrations'
  union all select format('constraint %s %s %s', conrelid::regclass, conname, pg_get_constraintdef(oid))
    from pg_constraint where connamespace = 'public'::regnamespace and conrelid <> 0 and conrelid::regclass::text <> 'migrations'
  union all select format('index %s', indexdef) from pg_indexes where schemaname = 'public' and tablename <> 'migrations'
  union all select format('policy %s %s %s %s %s %s', tablename, policyname, roles, cmd, qual, with_check) from pg_policies
  union all select format('right %s %s %s', table_name, grantee, privilege_type)
    from information_schema.role_table_grants where table_schema = 'public' and table_name <> 'migrations'
  union all select format('right %s.%s %s %s', table_name, column_name, grantee, privilege_type)
    from information_schema.column_privileges where table_schema = 'public' and table_name <> 'migrations'
  union all select format('trigger %s %s', tgrelid::regclass, pg_get_triggerdef(oid)) from pg_trigger where not tgisinternal
  union all select format('function %s', pg_get_functiondef(oid)) from pg_proc where pronamespace = 'public'::regnamespace
  union all select format('forced %s %s %s', relname, relrowsecurity, relforcerowsecurity)
    from pg_class where relnamespace = 'public'::regnamespace and relkind = 'r' and relname <> 'migrations'
  order by line`;

async function shape(): Promise<string[]> {
  const rows: { line: string }[] = await owner.query(SHAPE);
  return rows.map(({ line }) => line);
}

describe('migrations', () => {
  it('go down to nothing, and up again to what they were', async () => {
    const before = await shape();
    expect(before.length).toBeGreaterThan(200);
    for (let left = owner.migrations.length; left > 0; left -= 1) await owner.undoLastMigration({ transaction: 'each' });
    expect(await shape()).toEqual([]);
    await owner.runMigrations({ transaction: 'each' });
    expect(await shape()).toEqual(before);
  });

  it('give every table of company data its company first in the key, and force its row-level security', async () => {
    const rows: { name: string; first: string; forced: boolean }[] = await owner.query(`
      select relname as name, attname as first, relrowsecurity and relforcerowsecurity as forced
        from pg_class join pg_index on indrelid = pg_class.oid and indisprimary
        join pg_attribute on attrelid = pg_class.oid and attnum = indkey[0]
        where relnamespace = 'public'::regnamespace and relkind = 'r' and relname <> 'migrations'`);
    const ofNoCompany = ['companies', 'credentials', 'people', 'rate_limits', 'refresh_tokens', 'sessions'];
    expect(
      rows
        .filter(({ first }) => first !== 'company_id')
        .map(({ name }) => name)
        .sort(),
    ).toEqual(ofNoCompany);
    expect(rows.filter(({ forced }) => !forced)).toEqual([]);
  });

  it('make just the columns that the entities have', async () => {
    const columns: { line: string }[] = await owner.query(`
      select table_name || '.' || column_name || case is_nullable when 'YES' then ' null' else '' end as line
      from information_schema.columns join information_schema.tables using (table_schema, table_name)
      where table_schema = 'public' and table_type = 'BASE TABLE' and table_name not in ('migrations', 'rate_limits')`);
    const entities = owner.entityMetadatas
      .filter(({ tableName }) => tableName !== 'crew_people')
      .flatMap(({ tableName, columns: own }) =>
        own.map((column) => `${tableName}.${column.databaseName}${column.isNullable ? ' null' : ''}`),
      );
    expect(entities.sort()).toEqual(columns.map(({ line }) => line).sort());
  });
});
