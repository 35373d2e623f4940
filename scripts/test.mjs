/**
 * `npm test`: sets up what is missing, checks types, rules and format, and runs every test on a throw-away database.
 * With path filters (`npm test -- tests/core`) only the tests they choose. The last line is `N passed, N failed`.
 */
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { ensureChromium } from './setup/browser.mjs'
import { ensurePackages } from './setup/packages.mjs'
import { ensurePostgresPrograms } from './setup/postgresPrograms.mjs'
import { runProgram } from './setup/program.mjs'
import { ROOT, inProject } from './setup/project.mjs'
import { run } from './setup/run.mjs'
import { ensureScriptPrograms } from './setup/scriptPrograms.mjs'
import { beforeEnd } from './setup/stopping.mjs'
import { add, closingLine, countsOf } from './setup/testCounts.mjs'
import { needsOf } from './setup/testNeeds.mjs'
import { startThrowawayCluster } from './setup/throwawayCluster.mjs'

const say = console.log
const moduleProgram = (...parts) => inProject('node_modules', ...parts)
const TSC = moduleProgram('typescript', 'bin', 'tsc')

const CHECKS = [
  ...['core', 'node', 'web'].map((part) => ({
    name: `types (${part})`,
    args: [TSC, '-p', `tsconfig.${part}.json`, '--pretty', 'false'],
  })),
  { name: 'lint rules', args: [moduleProgram('eslint', 'bin', 'eslint.js'), '.', '--max-warnings', '0'] },
  {
    name: 'format',
    args: [moduleProgram('prettier', 'bin', 'prettier.cjs'), '--check', '--log-level', 'warn', '.'],
  },
]

/** Runs the checks one by one; what a failing one says is shown. */
async function runChecks() {
  let counts = { passed: 0, failed: 0 }
  for (const { name, args } of CHECKS) {
    const { status, stdout, stderr } = await run(process.execPath, args, { cwd: ROOT })
    say(`${status === 0 ? 'passed' : 'FAILED'}  ${name}`)
    if (status !== 0) say(`${stdout}${stderr}`.trimEnd())
    counts = add(counts, status === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 })
  }
  return counts
}

async function openCluster() {
  const programs = await ensurePostgresPrograms({ say })
  say('Starting a throw-away database')
  return startThrowawayCluster(programs)
}

async function runTests(filters, addresses) {
  const folder = mkdtempSync(join(tmpdir(), 'emberline-report-'))
  const forget = beforeEnd(() => rmSync(folder, { recursive: true, force: true }))
  const file = join(folder, 'report.json')
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${file}`]
  const shared = addresses === undefined ? {} : { EMBERLINE_TEST_CLUSTER: JSON.stringify(addresses) }
  const { status } = await run(
    process.execPath,
    [moduleProgram('vitest', 'vitest.mjs'), 'run', ...reporters, ...filters],
    {
      cwd: ROOT,
      env: { ...process.env, ...shared },
      output: 'show',
    },
  )
  const report = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : null
  rmSync(folder, { recursive: true, force: true })
  forget()
  return countsOf(report, status)
}

async function main() {
  const filters = process.argv.slice(2)
  const needs = needsOf(filters)
  await ensurePackages({ say })
  if (needs.browser) {
    await ensureChromium({ say })
    await ensureScriptPrograms({ say })
  }
  const cluster = needs.cluster ? await openCluster() : undefined
  const checks = filters.length === 0 ? await runChecks() : { passed: 0, failed: 0 }
  const counts = add(checks, await runTests(filters, cluster?.addresses))
  await cluster?.stop()
  say(`\n${closingLine(counts)}`)
  return counts.failed === 0 ? 0 : 1
}

await runProgram(main, {
  statusAfterSignal: 130,
  onFailure: () => say(`\n${closingLine({ passed: 0, failed: 1 })}`),
})
