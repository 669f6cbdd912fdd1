import { Client, escapeIdentifier, escapeLiteral } from 'pg';

/** Owns the database and everything in it; only migrations sign in as it. */
export const OWNER = 'tallyrod_owner';

/** The one role the server signs in as. It owns nothing and inherits nothing: it has to become one of SERVER_MAY_BECOME. */
export const SERVER = 'tallyrod_server';

/** Roles without sign-in, to which migrations grant what each may do: work on a company's data, and look after who people are. */
export const SERVER_MAY_BECOME = ['tallyrod_app', 'tallyrod_identity'] as const;

export interface RolePasswords {
  owner: string;
  server: string;
}

/** Runs work on one session and ends that session. */
export async function withClient<T>(url: string, work: (client: Client) => Promise<T>): Promise<T> {
  const client = new Client({ connectionString: url, application_name: 'tallyrod-scripts' });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** The URL of a database on the same server under another sign-in. */
export function urlFor(superUrl: string, database: string, signIn?: { user: string; password: string }): string {
  const url = new URL(superUrl);
  url.pathname = `/${database}`;
  if (signIn !== undefined) {
    url.username = signIn.user;
    url.password = encodeURIComponent(signIn.password);
  }
  return url.href;
}

const loginSql = (role: string, password: string, inherit: 'INHERIT' | 'NOINHERIT'): string =>
  `ALTER ROLE ${role} LOGIN ${inherit} NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS PASSWORD ${escapeLiteral(password)}`;

/**
 * Makes the roles of a cluster what they must be, whether they are there or not.
 *
 * @param superUrl of a superuser
 */
export async function ensureRoles(superUrl: string, passwords: RolePasswords): Promise<void> {
  await withClient(superUrl, async (client) => {
    for (const role of [OWNER, SERVER, ...SERVER_MAY_BECOME]) {
      const { rowCount } = await client.query('SELECT FROM pg_roles WHERE rolname = $1', [role]);
      if (rowCount === 0) await client.query(`CREATE ROLE ${role} NOLOGIN`);
    }
    await client.query(loginSql(OWNER, passwords.owner, 'INHERIT'));
    await client.query(loginSql(SERVER, passwords.server, 'NOINHERIT'));
    for (const role of SERVER_MAY_BECOME) {
      await client.query(`ALTER ROLE ${role} NOLOGIN NOSUPERUSER NOCREATEDB NOCREATEROLE NOREPLICATION NOBYPASSRLS`);
      await client.query(`GRANT ${role} TO ${SERVER}`);
    }
  });
}

/**
 * Makes a database that the owner owns and only the owner and the server may enter.
 *
 * Rights on a database do not come along when it is cloned, so a clone goes through here too.
 *
 * @param template cloned when given; nobody may be signed in to it meanwhile
 * @returns false when there was one of that name already: it is left as it is
 */
export async function ensureDatabase(superUrl: string, name: string, template = 'template0'): Promise<boolean> {
  return withClient(superUrl, async (client) => {
    const { rowCount } = await client.query('SELECT FROM pg_database WHERE datname = $1', [name]);
    if (rowCount !== 0) return false;
    const database = escapeIdentifier(name);
    await client.query(`CREATE DATABASE ${database} OWNER ${OWNER} TEMPLATE ${escapeIdentifier(template)}`);
    await client.query(`REVOKE ALL ON DATABASE ${database} FROM PUBLIC`);
    await client.query(`GRANT CONNECT ON DATABASE ${database} TO ${SERVER}`);
    return true;
  });
}
