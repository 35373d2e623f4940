import pg from 'pg'

/** A connection of the database's owner, with all groups in sight: for setting the stage, never for what is tested. */
export async function connectOwner(ownerUrl: string): Promise<pg.Client> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  await client.query("select set_config('emberline.across_groups', 'on', false)")
  return client
}

/** Runs an insert … returning id. */
export async function insertId(client: pg.Client, sql: string, values: unknown[]): Promise<string> {
  const { rows } = await client.query<{ id: string }>(sql, values)
  const [row] = rows
  if (row === undefined) throw new Error(`nothing returned by ${sql}`)
  return row.id
}
