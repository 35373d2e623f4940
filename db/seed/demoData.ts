import { InputError, candidateInput, historyInput, parseInput, role } from '#core/wire/index'
import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { z } from 'zod'

/** Programs are started from the project's root. */
const FOLDER = 'data-demo'

const email = z.email().endsWith('.example')
const name = z.string().trim().min(1).max(120)
const revisionNumber = z.number().int().positive()

const demoGroup = z.strictObject({
  name,
  baseline: z.strictObject({ history: name, revision: revisionNumber }),
  people: z.array(z.strictObject({ name, role, email, password: z.string().min(12) })).min(1),
})

const recordsOf = <T extends z.ZodType>(input: T) =>
  z.array(
    z.strictObject({
      name,
      revisions: z
        .array(z.strictObject({ author: email, at: z.iso.datetime(), note: z.string().max(2000), input }))
        .min(1),
    }),
  )

const named = z.strictObject({ name, revision: revisionNumber })
const demoHistories = recordsOf(historyInput)
const demoCandidates = recordsOf(candidateInput)
const demoEvaluations = z.array(z.strictObject({ author: email, history: named, candidate: named }))

export type DemoGroup = z.output<typeof demoGroup>
export type DemoRecord<Input> = {
  name: string
  revisions: { author: string; at: string; note: string; input: Input }[]
}

async function readDemoFile<S extends z.ZodType>(
  folder: string,
  file: string,
  schema: S,
): Promise<z.output<S>> {
  const path = join(folder, file)
  try {
    return parseInput(schema, JSON.parse(await readFile(path, 'utf8')))
  } catch (error) {
    if (error instanceof InputError)
      throw new Error(`${path} is at fault:\n${error.message}`, { cause: error })
    throw error
  }
}

/** The made-up group and its people, passwords in plain words. */
export const readDemoGroup = (folder = FOLDER): Promise<DemoGroup> =>
  readDemoFile(folder, 'group.json', demoGroup)

/** Everything the seed loads; throws with file, path and what is allowed when a file is at fault. */
export async function readDemoData(folder = FOLDER) {
  const [group, histories, candidates, evaluations] = await Promise.all([
    readDemoGroup(folder),
    readDemoFile(folder, 'histories.json', demoHistories),
    readDemoFile(folder, 'candidates.json', demoCandidates),
    readDemoFile(folder, 'evaluations.json', demoEvaluations),
  ])
  return { group, histories, candidates, evaluations }
}

export type DemoData = Awaited<ReturnType<typeof readDemoData>>
