import pg from "pg";

/** One statement behind the application's back, with the rights of the address. Answers its rows. */
export async function runSql<Row extends pg.QueryResultRow = pg.QueryResultRow>(
  url: string,
  statement: string,
  values: readonly unknown[] = [],
): Promise<Row[]> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Row>(statement, [...values])).rows;
  } finally {
    await client.end();
  }
}
