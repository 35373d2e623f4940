import { execFileSync } from 'node:child_process'

/** The browser meets what users meet: the built pages, served by the bundled server. */
export default function setUp(): void {
  execFileSync(process.execPath, ['scripts/build.mjs'], { stdio: 'inherit' })
}
