/** Builds the web app and the server into dist/; what is up to date is left alone. */
import { buildServer, buildWeb } from './setup/build.mjs'
import { ensurePackages } from './setup/packages.mjs'
import { runProgram } from './setup/program.mjs'

async function main() {
  const say = console.log
  await ensurePackages({ say })
  await buildWeb({ say })
  await buildServer({ say })
  return 0
}

await runProgram(main, { statusAfterSignal: 130 })
