import { mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { fingerprint } from '../../../scripts/setup/fingerprint.mjs'

let root

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'fingerprint-'))
  mkdirSync(join(root, 'web', 'src'), { recursive: true })
  writeFileSync(join(root, 'web', 'src', 'main.ts'), 'one')
  writeFileSync(join(root, 'other.ts'), 'one')
})

afterEach(() => rmSync(root, { recursive: true, force: true }))

const ofWeb = () => fingerprint(['web', 'not-there'], root)

it('stays the same while the inputs do, whatever happens beside them', () => {
  const before = ofWeb()
  writeFileSync(join(root, 'other.ts'), 'two')
  expect(ofWeb()).toBe(before)
})

it.each([
  ['changed', () => writeFileSync(join(root, 'web', 'src', 'main.ts'), 'two')],
  ['added', () => writeFileSync(join(root, 'web', 'src', 'more.ts'), '')],
  ['renamed', () => renameSync(join(root, 'web', 'src', 'main.ts'), join(root, 'web', 'src', 'start.ts'))],
])('is another when a file is %s', (_, change) => {
  const before = ofWeb()
  change()
  expect(ofWeb()).not.toBe(before)
})
