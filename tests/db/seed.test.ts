import { cp, mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { CORE_VERSION, computeAbundance } from '#core/index'
import { candidateInput, digestOf, historyInput } from '#core/wire/index'
import { passwordMatches } from '#db/passwordHash'
import { readDemoData } from '#db/seed/demoData'
import { seedDemo } from '#db/seed/seed'
import type pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { connectOwner } from './support/owner.ts'

let database: Awaited<ReturnType<typeof freshDatabase>>
let owner: pg.Client
let outcomes: string[]
beforeAll(async () => {
  database = await freshDatabase()
  owner = await connectOwner(database.ownerUrl)
  outcomes = await Promise.all([seedDemo(database.ownerUrl), seedDemo(database.ownerUrl)])
})
afterAll(async () => {
  await owner.end()
  await database.drop()
})

describe('the demo seed', () => {
  it('fills an empty database once, even when started twice at once', async () => {
    expect(outcomes.sort()).toEqual(['not-empty', 'seeded'])
    expect(await seedDemo(database.ownerUrl)).toBe('not-empty')
    const { rows } = await owner.query('select name from groups')
    expect(rows).toEqual([{ name: 'Larch Valley group' }])
  })

  it('makes one person of each role, whose passwords are those shown', async () => {
    const { group } = await readDemoData()
    const { rows } = await owner.query<{ email: string; role: string; password_hash: string }>(
      'select email, role, password_hash from users join memberships on user_id = id order by role',
    )
    expect(rows.map(({ role }) => role)).toEqual(['lead', 'author', 'reader'])
    for (const { email, password, role } of group.people) {
      const account = rows.find((row) => row.email === email)
      expect(account?.role).toBe(role)
      expect(await passwordMatches(account?.password_hash ?? '', password)).toBe(true)
    }
  })

  it('adopts the textbook steps as the baseline', async () => {
    const { rows } = await owner.query<{ name: string; treatment: string }>(
      `select h.name, r.input->'bath'->>'treatment' as treatment from groups g
       join history_revisions r on r.id = g.baseline_revision_id join histories h on h.id = r.history_id`,
    )
    expect(rows).toEqual([{ name: 'Textbook steps', treatment: 'thresholds' }])
  })

  it('stores eight histories and ten candidates whose inputs are whole and whose digests are theirs', async () => {
    for (const [table, schema, count] of [
      ['histories', historyInput, 8],
      ['candidates', candidateInput, 10],
    ] as const) {
      const noun = table === 'histories' ? 'history' : 'candidate'
      const { rows } = await owner.query<{ input: unknown; digest: string }>(
        `select r.input, r.digest from ${table} t join ${noun}_revisions r on r.${noun}_id = t.id and r.number = t.latest_number`,
      )
      expect(rows).toHaveLength(count)
      for (const { input, digest } of rows) {
        expect(schema.parse(input)).toEqual(input)
        expect(digestOf(input)).toBe(digest)
      }
    }
  })

  it('stores evaluations with the numbers the core gives now', async () => {
    const { rows } = await owner.query<Record<'history' | 'candidate' | 'result' | 'version', unknown>>(
      `select h.input as history, c.input as candidate, e.result, e.core_version as version from evaluations e
       join history_revisions h on h.id = e.history_revision_id
       join candidate_revisions c on c.id = e.candidate_revision_id`,
    )
    expect(rows).toHaveLength(3)
    for (const { history, candidate, result, version } of rows) {
      expect(version).toBe(CORE_VERSION)
      expect(result).toEqual(computeAbundance({ history, candidate }))
    }
  })
})

describe('a demo file at fault', () => {
  it('is named with the path inside it and what is allowed', async () => {
    const folder = await mkdtemp(join(tmpdir(), 'emberline-demo-'))
    await cp('data-demo', folder, { recursive: true })
    const file = join(folder, 'candidates.json')
    await writeFile(file, (await readFile(file, 'utf8')).replace('"massGeV": 100', '"massGeV": -100'))
    await expect(readDemoData(folder)).rejects.toThrow(
      /candidates\.json is at fault:\n\[0\]\.revisions\[0\]\.input\.massGeV: .+\(found -100\)/,
    )
    await rm(folder, { recursive: true })
  })
})

describe('every demo candidate in every demo history', () => {
  it('gives a number, but for what is made at a highest temperature that most histories leave open', async () => {
    const { histories, candidates } = await readDemoData()
    for (const history of histories) {
      for (const candidate of candidates) {
        const input = {
          history: history.revisions.at(-1)?.input,
          candidate: candidate.revisions.at(-1)?.input,
        }
        const open =
          candidate.revisions.at(-1)?.input.mechanism === 'freeze-in-ultraviolet' &&
          input.history?.maximumTemperatureGeV === null
        if (open) expect(() => computeAbundance(input)).toThrow('history.maximumTemperatureGeV: needed')
        else
          expect(computeAbundance(input).omegaH2, `${candidate.name} in ${history.name}`).toBeGreaterThan(0)
      }
    }
  })
})
