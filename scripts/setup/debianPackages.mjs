import { existsSync } from 'node:fs'
import { run } from './run.mjs'
import { Trouble } from './trouble.mjs'

const APT_GET = '/usr/bin/apt-get'
/** Another installation on the machine may hold the package database for a while, seconds. */
const LOCK_OPTIONS = ['-o', 'DPkg::Lock::Timeout=300']

const aptGet = (args) =>
  run(APT_GET, [...LOCK_OPTIONS, ...args], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    whenStopping: 'finish',
  })

const install = (name) => aptGet(['install', '--yes', '--no-install-recommends', name])

/**
 * Installs a Debian package when root runs this on Debian; otherwise Trouble with the one command to run.
 * `command` is that command without sudo, `seconds` how long to expect, `before` what to do ahead of it.
 */
export async function installDebianPackage({ name, what, command, seconds, before = () => undefined, say }) {
  if (!existsSync(APT_GET)) {
    throw new Trouble(
      `${what} is missing, and this is not Debian: install it, then give the same command again.`,
    )
  }
  if (process.getuid() !== 0) {
    throw new Trouble(
      `${what} is missing, and only an administrator may install it. Nothing was changed. Run once:\n\n` +
        `    sudo ${command}\n\nthen give the same command again.`,
    )
  }
  say(`Installing ${what} from Debian's package ${name} (about ${seconds} s)`)
  before()
  let ended = await install(name)
  if (ended.status !== 0) {
    say("Refreshing Debian's list of packages")
    await aptGet(['update'])
    ended = await install(name)
  }
  if (ended.status === 0) return
  throw new Trouble(
    `${what} could not be installed; apt-get said:\n${ended.stderr.trim()}\n\nTry by hand: ${command}`,
  )
}
