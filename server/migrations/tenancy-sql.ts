/**
 * SQL that every table needs from its first day on. Migrations that have landed are read through it, so it is added to and
 * never changed: what an old migration printed must stay what it prints.
 */

/** Nobody, not even the owner of the table, gets past the table's policies. */
export function forceRowSecurity(table: string): string {
  return `alter table ${table} enable row level security; alter table ${table} force row level security;`;
}

/** Rows of the company that the transaction has set, and no others. `key`: the column that holds the company's id. */
export function companyRowsOnly(table: string, key = 'company_id'): string {
  return `${forceRowSecurity(table)}
    create policy company_rows on ${table} using (${key} = current_company()) with check (${key} = current_company());`;
}

/** A table of no company: the identity role alone sees it. */
export function identityRowsOnly(table: string): string {
  return `${forceRowSecurity(table)} ${openToIdentity(table)}`;
}

/** Lets the identity role past a table's company policy; what it may do there, grants say. */
export function openToIdentity(table: string): string {
  return `create policy identity_rows on ${table} to tallyrod_identity using (true) with check (true);`;
}

/** What is written stays as it was written, whoever asks: the owner of the table too. */
export function writtenOnce(table: string): string {
  return `
    create trigger ${table}_written_once before update or delete on ${table} for each row execute function refuse_change();
    create trigger ${table}_never_emptied before truncate on ${table} for each statement execute function refuse_change();`;
}
