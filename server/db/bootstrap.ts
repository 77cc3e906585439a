import pg from "pg";

export const roles = { owner: "tempermark_owner", web: "web", editionBuilder: "edition_builder" } as const;

export interface RolePasswords {
  owner: string;
  web: string;
  editionBuilder: string;
}

export async function withClient<Result>(url: string, work: (client: pg.Client) => Promise<Result>): Promise<Result> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return await work(client);
  } finally {
    await client.end();
  }
}

/** Made if missing; its password and its lack of privileges are set again each time. */
async function ensureRole(client: pg.Client, name: string, password: string): Promise<void> {
  const role = client.escapeIdentifier(name);
  const known = await client.query("select 1 from pg_roles where rolname = $1", [name]);
  if (known.rowCount === 0) await client.query(`create role ${role}`);
  await client.query(
    `alter role ${role} login nosuperuser nocreatedb nocreaterole noreplication nobypassrls password ${client.escapeLiteral(password)}`,
  );
}

/** Privileges on a database itself are not copied from a template: every new one gets them here. */
export async function createOwnedDatabase(client: pg.Client, name: string, template?: string): Promise<void> {
  const database = client.escapeIdentifier(name);
  const from = template ? ` template ${client.escapeIdentifier(template)}` : "";
  await client.query(`create database ${database} owner ${client.escapeIdentifier(roles.owner)}${from}`);
  await client.query(`revoke all on database ${database} from public`);
  await client.query(`grant connect on database ${database} to ${roles.web}, ${roles.editionBuilder}`);
}

/**
 * The three roles and the database they work in. Safe to run again: what exists keeps its data.
 * @param superuserUrl  any database of the server, as a role that may create roles and databases
 */
export async function bootstrapDatabase(
  superuserUrl: string,
  options: { database: string; passwords: RolePasswords },
): Promise<void> {
  const { database, passwords } = options;
  await withClient(superuserUrl, async (client) => {
    await ensureRole(client, roles.owner, passwords.owner);
    await ensureRole(client, roles.web, passwords.web);
    await ensureRole(client, roles.editionBuilder, passwords.editionBuilder);
    const known = await client.query("select 1 from pg_database where datname = $1", [database]);
    if (known.rowCount === 0) await createOwnedDatabase(client, database);
  });
  const own = new URL(superuserUrl);
  own.pathname = `/${database}`;
  // Already the default of PostgreSQL 15; said for servers that were upgraded from an older one.
  await withClient(own.href, (client) => client.query("revoke create on schema public from public"));
}
