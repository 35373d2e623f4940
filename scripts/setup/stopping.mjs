/** What has to happen before this process ends, however it ends: the newest step first, once. */
const steps = []
let stopping

export const isStopping = () => stopping !== undefined

/** Registers a step to run before the process ends; the function returned takes it back. */
export function beforeEnd(step) {
  steps.push(step)
  return () => {
    const index = steps.indexOf(step)
    if (index >= 0) steps.splice(index, 1)
  }
}

/** Runs the steps. Whoever calls again waits for the same run: Ctrl-C reaches npm and node, so signals come twice. */
export function stop() {
  stopping ??= Promise.resolve().then(runSteps)
  return stopping
}

async function runSteps() {
  for (let step = steps.pop(); step !== undefined; step = steps.pop()) {
    try {
      await step()
    } catch (error) {
      console.error(error.message)
    }
  }
}
