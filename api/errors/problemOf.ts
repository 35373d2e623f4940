import { ConvergenceError } from '#core/index'
import { InputError } from '#core/wire/index'
import { ProblemError } from './problemError.ts'

/** How express's body parser names what went wrong. */
interface BodyParserError {
  type: string
  limit?: number
}

const isBodyParserError = (error: unknown): error is BodyParserError =>
  error instanceof Error && 'type' in error && typeof error.type === 'string'

function bodyProblem(error: BodyParserError): ProblemError | null {
  switch (error.type) {
    case 'entity.too.large':
      return new ProblemError(
        'too-large',
        `At most ${error.limit ?? 0} bytes are taken. Nothing was saved; send less.`,
      )
    case 'encoding.unsupported':
    case 'charset.unsupported':
      return new ProblemError('not-json', 'Send JSON in UTF-8, plain or compressed with gzip, deflate or br.')
    case 'entity.parse.failed':
    case 'entity.verify.failed':
    case 'request.size.invalid':
    case 'request.aborted':
      return new ProblemError(
        'malformed-body',
        'The body is not JSON. Nothing was saved; check it and send it again.',
      )
    default:
      return null
  }
}

/** The problem an error stands for; null when nobody foresaw it. */
export function problemOf(error: unknown): ProblemError | null {
  if (error instanceof ProblemError) return error
  if (error instanceof InputError) {
    const count = error.faults.length === 1 ? 'One field does' : `${error.faults.length} fields do`
    return new ProblemError('invalid-input', `${count} not fit; see the faults. Nothing was saved.`, {
      faults: error.faults,
    })
  }
  if (error instanceof ConvergenceError) {
    return new ProblemError(
      'no-convergence',
      `The solver gave no number: ${error.reason}. Nothing was saved.`,
    )
  }
  return isBodyParserError(error) ? bodyProblem(error) : null
}
