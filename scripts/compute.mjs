/** `npm run --silent compute`: the core's command line. Nothing but its result goes to standard output. */
import { pathToFileURL } from 'node:url'
import { buildProgram } from './setup/build.mjs'
import { ensurePackages } from './setup/packages.mjs'
import { runProgram } from './setup/program.mjs'

async function main() {
  const say = console.error
  await ensurePackages({ say })
  const file = await buildProgram({
    name: 'compute.mjs',
    entry: 'scripts/compute-main.ts',
    inputs: ['core'],
    packages: 'bundle',
    say,
  })
  const program = await import(pathToFileURL(file))
  // Whoever reads may have read enough, as `head` does.
  process.stdout.on('error', (error) => {
    if (error.code !== 'EPIPE') throw error
    process.exit(0)
  })
  return program.main(process.argv.slice(2))
}

await runProgram(main, { statusAfterSignal: 130 })
