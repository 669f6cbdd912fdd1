import type { MigrationInterface, QueryRunner } from 'typeorm';
import { companyRowsOnly, identityRowsOnly, openToIdentity } from './tenancy-sql';

/** Companies, people, how they sign in, and who is what in which company. */
export class People1764579600000 implements MigrationInterface {
  readonly name = 'People1764579600000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create function current_company() returns uuid language sql stable
        as $$ select nullif(current_setting('app.company_id', true), '')::uuid $$;

      create function refuse_change() returns trigger language plpgsql as $$
        begin
          raise exception '% is written once: no % of it', tg_table_name, lower(tg_op) using errcode = 'restrict_violation';
        end $$;

      create table companies (
        id uuid primary key,
        name text not null check (length(name) between 1 and 120),
        created_at timestamptz not null
      );
      ${companyRowsOnly('companies', 'id')}
      ${openToIdentity('companies')}
      grant select on companies to tallyrod_app;
      grant select, insert on companies to tallyrod_identity;

      create table people (
        id uuid primary key,
        name text not null check (length(name) between 1 and 120),
        email text not null unique check (email = lower(email) and length(email) <= 200),
        created_at timestamptz not null
      );
      ${identityRowsOnly('people')}
      grant select, insert on people to tallyrod_identity;

      create table credentials (
        person_id uuid primary key references people,
        hash text not null check (hash like '$argon2id$%'),
        changed_at timestamptz not null
      );
      ${identityRowsOnly('credentials')}
      grant select, insert, update on credentials to tallyrod_identity;

      create table memberships (
        company_id uuid not null references companies,
        person_id uuid not null references people,
        roles text[] not null check (roles <@ array['owner', 'super', 'operator', 'installer']),
        created_at timestamptz not null,
        primary key (company_id, person_id)
      );
      create index memberships_of_person on memberships (person_id);
      ${companyRowsOnly('memberships')}
      ${openToIdentity('memberships')}
      grant select, update (roles) on memberships to tallyrod_app;
      grant select, insert on memberships to tallyrod_identity;
    `);
    await runner.query(`
      create table sessions (
        id uuid primary key,
        person_id uuid not null references people,
        company_id uuid not null references companies,
        created_at timestamptz not null,
        expires_at timestamptz not null,
        generation integer not null check (generation > 0),
        rotated_at timestamptz not null,
        ended_at timestamptz,
        ended_because text check (ended_because in ('signed-out', 'token-reused')),
        check ((ended_at is null) = (ended_because is null)),
        foreign key (company_id, person_id) references memberships (company_id, person_id)
      );
      create index sessions_of_person on sessions (person_id, created_at);
      ${identityRowsOnly('sessions')}
      grant select, insert, update (generation, rotated_at, expires_at, ended_at, ended_because) on sessions to tallyrod_identity;

      create table refresh_tokens (
        hash text primary key check (length(hash) = 64),
        session_id uuid not null references sessions,
        generation integer not null check (generation > 0),
        issued_at timestamptz not null
      );
      create index refresh_tokens_of_session on refresh_tokens (session_id);
      ${identityRowsOnly('refresh_tokens')}
      grant select, insert on refresh_tokens to tallyrod_identity;

      create table rate_limits (
        key text primary key,
        hits integer not null,
        resets_at timestamptz not null
      );
      create index rate_limits_by_age on rate_limits (resets_at);
      ${identityRowsOnly('rate_limits')}
      grant select, insert, update, delete on rate_limits to tallyrod_identity;

      -- The crew list is all that a company sees of people. A view reads with the rights of its owner, who is held by the
      -- policies as anybody is: hence one that opens people of the company to the owner, and nothing else.
      create policy people_of_company on people for select to tallyrod_owner
        using (exists (select from memberships where memberships.person_id = people.id and memberships.company_id = current_company()));
      create view crew_people with (security_barrier) as select id, name, email from people;
      grant select on crew_people to tallyrod_app;
    `);
  }

  async down(runner: QueryRunner): Promise<void> {
    await runner.query(`
      drop view crew_people;
      drop table rate_limits;
      drop table refresh_tokens;
      drop table sessions;
      drop policy people_of_company on people;
      drop table memberships;
      drop table credentials;
      drop table people;
      drop table companies;
      drop function refuse_change();
      drop function current_company();
    `);
  }
}
