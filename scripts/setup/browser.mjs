import { existsSync } from 'node:fs'
import { installDebianPackage } from './debianPackages.mjs'

/** Debian's Chromium, which the browser test drives. */
export const CHROMIUM = '/usr/bin/chromium'

export async function ensureChromium({ say }) {
  if (existsSync(CHROMIUM)) return
  await installDebianPackage({
    name: 'chromium',
    what: 'Chromium',
    command: 'apt-get install -y --no-install-recommends chromium',
    seconds: 20,
    say,
  })
}
