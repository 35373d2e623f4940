import { isStopping, stop } from './stopping.mjs'
import { Trouble } from './trouble.mjs'

const OLDEST_NODE = [20, 19]

const nothing = () => undefined

function complain(error) {
  console.error(error instanceof Trouble ? `\n${error.message}` : error)
}

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major > OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor >= OLDEST_NODE[1])) return
  throw new Trouble(
    `Emberline needs Node.js ${OLDEST_NODE.join('.')} or newer; this is ${process.versions.node}. Nothing was changed.`,
  )
}

/**
 * Runs `main`, which resolves to the exit status, and then every step registered with beforeEnd; a signal runs the
 * steps too and ends with `statusAfterSignal`. `onSignal` and `onFailure` are told before the steps run.
 */
export async function runProgram(main, { statusAfterSignal, onSignal = nothing, onFailure = nothing }) {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
    process.on(signal, () => {
      if (!isStopping()) onSignal()
      void stop().then(() => process.exit(statusAfterSignal))
    })
  }
  let status
  try {
    checkNode()
    status = await main()
  } catch (error) {
    // What breaks while stopping breaks because of it, and the signal's own handler ends the process.
    if (isStopping()) return
    complain(error)
    onFailure()
    status = 1
  }
  await stop()
  process.exitCode = status
}
