import { existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { withLock } from './fileLock.mjs'
import { fingerprint } from './fingerprint.mjs'
import { DATA_FOLDER, ROOT, inProject } from './project.mjs'
import { mustRun } from './run.mjs'
import { Trouble } from './trouble.mjs'

const DIST = inProject('dist')
const COMMON_INPUTS = ['package.json', 'package-lock.json', 'scripts/setup/build.mjs', 'tsconfig.base.json']

/** Builds `name` in dist/ unless it was built from the same inputs; one build at a time. */
async function buildOnce({ name, inputs, say, sentence, build }) {
  const target = join(DIST, name)
  const stamp = join(DIST, `${name}.inputs`)
  const upToDate = (digest) =>
    existsSync(target) && existsSync(stamp) && readFileSync(stamp, 'utf8') === digest
  const digest = fingerprint([...COMMON_INPUTS, ...inputs])
  if (upToDate(digest)) return target
  const waiting = () => say('Waiting for another command that is building')
  return withLock(join(DATA_FOLDER, 'build.lock'), waiting, async () => {
    if (upToDate(digest)) return target
    say(sentence)
    mkdirSync(DIST, { recursive: true })
    rmSync(stamp, { force: true })
    await build(target)
    writeFileSync(stamp, digest)
    return target
  })
}

async function esbuild(options) {
  const { build, stop } = await import('esbuild')
  try {
    return await build({
      absWorkingDir: ROOT,
      bundle: true,
      platform: 'node',
      format: 'esm',
      target: 'node20',
      logLevel: 'silent',
      ...options,
    })
  } catch (error) {
    throw new Trouble(`The build failed. What was built before is unchanged.\n${error.message}`)
  } finally {
    await stop()
  }
}

/** The web app, in dist/web. */
export const buildWeb = ({ say }) =>
  buildOnce({
    name: 'web',
    inputs: ['web', 'core', 'vite.config.ts', 'tsconfig.web.json'],
    say,
    sentence: 'Building the web app',
    build: () =>
      mustRun(process.execPath, [inProject('node_modules', 'vite', 'bin', 'vite.js'), 'build'], {
        cwd: ROOT,
        env: { ...process.env, NODE_ENV: 'production' },
        failure: 'The web app could not be built. The data is untouched.',
      }),
  })

/** The server, the migrator and the seed, in dist/server; packages stay in node_modules. */
export const buildServer = ({ say }) =>
  buildOnce({
    name: 'server',
    inputs: ['api', 'core', 'db'],
    say,
    sentence: 'Building the server',
    build: (outdir) =>
      esbuild({
        entryPoints: ['api/server.ts', 'db/migrate.ts', 'db/seed/seed.ts'],
        entryNames: '[name]',
        outdir,
        packages: 'external',
        sourcemap: 'linked',
      }),
  })

/** One program in one file, replaced whole: another process may be reading the old one. */
export const buildProgram = ({ name, entry, inputs, packages, say }) =>
  buildOnce({
    name,
    inputs: [entry, ...inputs],
    say,
    sentence: `Building ${entry}`,
    build: async (target) => {
      const { outputFiles } = await esbuild({ entryPoints: [entry], outfile: target, packages, write: false })
      const unfinished = join(DIST, `.${name}.${process.pid}`)
      writeFileSync(unfinished, outputFiles[0].contents)
      renameSync(unfinished, target)
    },
  })
