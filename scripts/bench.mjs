/** `npm run bench`: the measurements of bench/, bundled as the server is. */
import { pathToFileURL } from 'node:url'
import { buildProgram } from './setup/build.mjs'
import { ensurePackages } from './setup/packages.mjs'
import { runProgram } from './setup/program.mjs'

async function main() {
  const say = console.error
  await ensurePackages({ say })
  const file = await buildProgram({
    name: 'bench.mjs',
    entry: 'bench/main.ts',
    inputs: ['bench', 'core', 'api', 'db'],
    packages: 'external',
    say,
  })
  const program = await import(pathToFileURL(file))
  return program.main(process.argv.slice(2))
}

await runProgram(main, { statusAfterSignal: 130 })
