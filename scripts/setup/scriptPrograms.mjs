import { existsSync } from 'node:fs'
import { installDebianPackage } from './debianPackages.mjs'

/** What the documented examples of the API are run with in the tests. */
const PROGRAMS = [
  { file: '/usr/bin/curl', name: 'curl', what: 'curl' },
  { file: '/usr/bin/python3', name: 'python3', what: 'Python 3' },
]

export async function ensureScriptPrograms({ say }) {
  for (const { file, name, what } of PROGRAMS) {
    if (existsSync(file)) continue
    await installDebianPackage({
      name,
      what,
      command: `apt-get install -y --no-install-recommends ${name}`,
      seconds: 10,
      say,
    })
  }
}
