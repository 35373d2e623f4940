/** The `compute` command: one JSON input on standard input, or one a line, to one result or one a line. */
import { createInterface } from 'node:readline'
import { text } from 'node:stream/consumers'
import { ConvergenceError, QUESTIONS, complete } from '#core/index'
import type { Question } from '#core/index'
import { InputError, faultLine } from '#core/wire/index'

/** The question of that name, answered at once; undefined for a name the core does not know. */
function questionOf(what: string | undefined): ((input: unknown) => unknown) | undefined {
  if (what === undefined || !Object.hasOwn(QUESTIONS, what)) return undefined
  return (input) => complete<unknown>(QUESTIONS[what as Question](input))
}

const USAGE = `usage: npm run --silent compute -- ${Object.keys(QUESTIONS).join('|')} [--lines] < input.json > output.json
  reads one JSON input and writes one JSON result; with --lines, one input and one result (or {"error": …}) a line`

const USAGE_STATUS = 2

type Outcome = { result: unknown } | { error: { name: string; message: string; faults?: unknown } }

/** Answers one text of JSON; whatever is wrong with it is in the outcome. */
function answer(question: (input: unknown) => unknown, json: string): Outcome {
  let input: unknown
  try {
    input = JSON.parse(json)
  } catch (error) {
    const message = `not JSON: ${error instanceof Error ? error.message : String(error)}`
    return { error: { name: 'InputError', message, faults: [{ path: '', message }] } }
  }
  try {
    return { result: question(input) }
  } catch (error) {
    if (error instanceof InputError)
      return { error: { name: error.name, message: 'the input is at fault', faults: error.faults } }
    if (error instanceof ConvergenceError) return { error: { name: error.name, message: error.reason } }
    throw error
  }
}

function complain(outcome: Extract<Outcome, { error: unknown }>): void {
  const { message, faults } = outcome.error
  const lines = Array.isArray(faults) ? faults.map(faultLine) : [message]
  process.stderr.write(`${lines.join('\n')}\n`)
}

async function answerLines(question: (input: unknown) => unknown): Promise<void> {
  for await (const line of createInterface({ input: process.stdin, crlfDelay: Infinity })) {
    if (line.trim() === '') continue
    const outcome = answer(question, line)
    const written = process.stdout.write(
      `${JSON.stringify('result' in outcome ? outcome.result : outcome)}\n`,
    )
    if (!written) await new Promise((resolve) => process.stdout.once('drain', resolve))
  }
}

/** Runs the command; resolves to the exit status: 0, or 2 when the input or the words of the command are at fault. */
export async function main(argv: readonly string[]): Promise<number> {
  const [what, ...flags] = argv
  const question = questionOf(what)
  const unknownFlag = flags.find((flag) => flag !== '--lines')
  if (!question || unknownFlag !== undefined) {
    process.stderr.write(`${USAGE}\n`)
    return what === '--help' ? 0 : USAGE_STATUS
  }
  if (flags.includes('--lines')) {
    await answerLines(question)
    return 0
  }
  const outcome = answer(question, await text(process.stdin))
  if ('error' in outcome) {
    complain(outcome)
    return USAGE_STATUS
  }
  process.stdout.write(`${JSON.stringify(outcome.result, null, 2)}\n`)
  return 0
}
