import pg from 'pg'
import PgBoss from 'pg-boss'
import { QUEUES, QUEUE_SCHEMA } from './queues.ts'

/** What the server's role may do with the queue: everything a worker does, nothing that changes tables or queues. */
const GRANTS = `
  REVOKE EXECUTE ON FUNCTION ${QUEUE_SCHEMA}.create_queue(text, json), ${QUEUE_SCHEMA}.delete_queue(text) FROM PUBLIC;
  GRANT USAGE ON SCHEMA ${QUEUE_SCHEMA} TO emberline_server;
  GRANT SELECT ON ${QUEUE_SCHEMA}.version, ${QUEUE_SCHEMA}.queue TO emberline_server;
  GRANT UPDATE (maintained_on) ON ${QUEUE_SCHEMA}.version TO emberline_server;
  GRANT SELECT, INSERT, UPDATE, DELETE ON ${QUEUE_SCHEMA}.job TO emberline_server;
  GRANT SELECT, INSERT, DELETE ON ${QUEUE_SCHEMA}.archive TO emberline_server;`

async function makeQueues(boss: PgBoss): Promise<void> {
  for (const { name, options } of QUEUES) {
    await boss.createQueue(name, { name, ...options })
    await boss.updateQueue(name, { name, ...options })
  }
}

/** Makes the queue's tables and queues, or brings them up to date; `url` signs in as the owner. One at a time. */
export async function installQueue(url: string): Promise<void> {
  const pool = new pg.Pool({ connectionString: url, max: 1 })
  const boss = new PgBoss({
    schema: QUEUE_SCHEMA,
    supervise: false,
    schedule: false,
    db: { executeSql: (text, values) => pool.query(text, values) },
  })
  try {
    await boss.start()
    await makeQueues(boss)
    await pool.query(GRANTS)
  } finally {
    await boss.stop({ graceful: false })
    await pool.end()
  }
}
