/** The `compute` command: one JSON input on standard input, or one a line, to one result or one a line. */
import { createInterface } from 'node:readline'
import { text } from 'node:stream/consumers'
import { setImmediate } from 'node:timers/promises'
import { ConvergenceError, QUESTIONS, completeAsync, inSlices } from '#core/index'
import type { Progress, Question, Steps } from '#core/index'
import { InputError, faultLine } from '#core/wire/index'

type Ask = (input: unknown) => Steps<unknown>

const isQuestion = (word: string | undefined): word is Question =>
  word !== undefined && Object.hasOwn(QUESTIONS, word)

const USAGE = `usage: npm run --silent compute -- ${Object.keys(QUESTIONS).join('|')} [--lines] < input.json > output.json
  reads one JSON input and writes one JSON result; with --lines, one input and one result (or {"error": …}) a line.
  Ctrl-C ends a long computation without a result, status 130.`

const USAGE_STATUS = 2

/** Work between two looks at signals, ms. */
const SLICE_MS = 20

/** How long a computation may take before its progress is shown, and how often then, ms. */
const FIRST_NEWS_MS = 1500
const NEWS_EVERY_MS = 250

type Outcome = { result: unknown } | { error: { name: string; message: string; faults?: unknown } }

/** Shows the progress on a terminal, in place, where the result is not in its way; to be cleared when there is a result. */
function progressOnTerminal(): { show: (progress: Progress) => void; clear: () => void } {
  let next = performance.now() + FIRST_NEWS_MS
  let shown = false
  return {
    show({ done, of }) {
      if (!process.stderr.isTTY || performance.now() < next) return
      process.stderr.write(`\r${Math.floor((100 * done) / of)} %`)
      shown = true
      next = performance.now() + NEWS_EVERY_MS
    },
    clear() {
      if (shown) process.stderr.write('\r      \r')
    },
  }
}

/** Answers one text of JSON; whatever is wrong with it is in the outcome. */
async function answer(ask: Ask, json: string): Promise<Outcome> {
  let input: unknown
  try {
    input = JSON.parse(json)
  } catch (error) {
    const message = `not JSON: ${error instanceof Error ? error.message : String(error)}`
    return { error: { name: 'InputError', message, faults: [{ path: '', message }] } }
  }
  const progress = progressOnTerminal()
  try {
    const pause = inSlices(
      SLICE_MS,
      () => performance.now(),
      () => setImmediate(),
    )
    return { result: await completeAsync(ask(input), { pause, onProgress: progress.show }) }
  } catch (error) {
    if (error instanceof InputError)
      return { error: { name: error.name, message: 'the input is at fault', faults: error.faults } }
    if (error instanceof ConvergenceError) return { error: { name: error.name, message: error.reason } }
    throw error
  } finally {
    progress.clear()
  }
}

function complain(outcome: Extract<Outcome, { error: unknown }>): void {
  const { message, faults } = outcome.error
  const lines = Array.isArray(faults) ? faults.map(faultLine) : [message]
  process.stderr.write(`${lines.join('\n')}\n`)
}

async function answerLines(ask: Ask): Promise<void> {
  for await (const line of createInterface({ input: process.stdin, crlfDelay: Infinity })) {
    if (line.trim() === '') continue
    const outcome = await answer(ask, line)
    const written = process.stdout.write(
      `${JSON.stringify('result' in outcome ? outcome.result : outcome)}\n`,
    )
    if (!written) await new Promise((resolve) => process.stdout.once('drain', resolve))
  }
}

/** Runs the command; resolves to the exit status: 0, or 2 when the input or the words of the command are at fault. */
export async function main(argv: readonly string[]): Promise<number> {
  const [what, ...flags] = argv
  const unknownFlag = flags.find((flag) => flag !== '--lines')
  if (!isQuestion(what) || unknownFlag !== undefined) {
    process.stderr.write(`${USAGE}\n`)
    return what === '--help' ? 0 : USAGE_STATUS
  }
  const ask: Ask = QUESTIONS[what]
  if (flags.includes('--lines')) {
    await answerLines(ask)
    return 0
  }
  const outcome = await answer(ask, await text(process.stdin))
  if ('error' in outcome) {
    complain(outcome)
    return USAGE_STATUS
  }
  process.stdout.write(`${JSON.stringify(outcome.result, null, 2)}\n`)
  return 0
}
