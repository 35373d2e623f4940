import { setTimeout as sleep } from 'node:timers/promises'
import type PgBoss from 'pg-boss'

export interface WorkerOptions {
  /** Jobs taken at once; each succeeds or fails by itself. */
  atOnce: number
  /** How long to wait before looking again when there was nothing. */
  pollingMs: number
}

export interface Worker {
  /** Takes no more jobs; what is not finished after `patienceMs` goes back to the queue. */
  stop(patienceMs: number): Promise<void>
}

/** What may be kept of a failure: the messages of a mail server can name people. */
function kept(error: unknown): object {
  const { name, code, responseCode } = error as { name?: string; code?: string; responseCode?: number }
  return { name, code, responseCode }
}

/**
 * Takes jobs and does them until stopped. The package's own worker leaves the promise that marks a job as done to
 * itself: a database gone at that moment would end the process. Here the job is merely done again.
 */
export function startWorker(
  boss: PgBoss,
  queue: string,
  { atOnce, pollingMs }: WorkerOptions,
  onError: (error: Error) => void,
  handle: (job: PgBoss.Job) => Promise<void>,
): Worker {
  const stopping = new AbortController()
  const underWay = new Set<string>()
  const report = (error: unknown): void =>
    onError(error instanceof Error ? error : new Error(`a job of ${queue} failed`))

  const doOne = async (job: PgBoss.Job): Promise<void> => {
    underWay.add(job.id)
    try {
      await handle(job)
      await boss.complete(queue, job.id)
    } catch (error) {
      report(error)
      await boss.fail(queue, job.id, kept(error)).catch(report)
    } finally {
      underWay.delete(job.id)
    }
  }
  const loop = async (): Promise<void> => {
    while (!stopping.signal.aborted) {
      const jobs = (await boss.fetch<object>(queue, { batchSize: atOnce }).catch(report)) ?? []
      await Promise.all(jobs.map(doOne))
      if (jobs.length < atOnce)
        await sleep(pollingMs, undefined, { signal: stopping.signal }).catch(() => undefined)
    }
  }
  const ended = loop()
  return {
    async stop(patienceMs) {
      stopping.abort()
      await Promise.race([ended, sleep(patienceMs, undefined, { ref: false })])
      await Promise.all([...underWay].map((id) => boss.fail(queue, id, { name: 'stopped' }).catch(report)))
    },
  }
}
