/** Owns the tables and migrates them. */
export const ownerRole = "standproud_owner";
/** Runs the application and its queue; owns nothing, so the database can refuse it what must never change. */
export const appRole = "standproud_app";
export const databaseName = "standproud";

/**
 * SQL for psql that makes the two roles, or gives them these passwords when they exist.
 * @param {{ owner: string, app: string }} passwords hexadecimal, so they need no quoting
 */
export function rolesSql({ owner, app }) {
  return [roleSql(ownerRole, owner), roleSql(appRole, app)].join("\n");
}

/**
 * @param {string} role
 * @param {string} password
 */
function roleSql(role, password) {
  return `select 'create role ${role}' where not exists (select from pg_roles where rolname = '${role}') \\gexec
alter role ${role} login nosuperuser nocreatedb nocreaterole nobypassrls noreplication password '${password}';`;
}

/** SQL for psql that makes the database when it is missing; only the two roles may enter it. */
export const databaseSql = `select 'create database ${databaseName} owner ${ownerRole}' where not exists (select from pg_database where datname = '${databaseName}') \\gexec
${databaseRightsSql(databaseName)}`;

/**
 * SQL that lets only the two roles into a database. The application's role may make temporary objects there: Sequelize
 * finds or creates a row by a function of the session's own.
 * @param {string} database a plain name
 */
export function databaseRightsSql(database) {
  return `revoke all on database ${database} from public; grant connect, temporary on database ${database} to ${appRole};`;
}

/**
 * The address of a database on loopback.
 * @param {{ role: string, password?: string, port: number, database?: string }} parts
 */
export function databaseUrl({ role, password, port, database = databaseName }) {
  return `postgres://${role}${password === undefined ? "" : `:${password}`}@127.0.0.1:${port}/${database}`;
}
