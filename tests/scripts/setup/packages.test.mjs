import { expect, it } from 'vitest'
import { isInstalled } from '../../../scripts/setup/packages.mjs'

const locked = {
  packages: {
    '': { name: 'emberline' },
    'node_modules/a': { version: '1.0.0' },
    'node_modules/b': { version: '2.1.0' },
    'node_modules/b-darwin': { version: '2.1.0', optional: true },
  },
}
const installed = (packages) => ({ packages })
const a = { version: '1.0.0' }
const b = { version: '2.1.0' }

it('takes packages installed by hand, without those for other machines, for the ones locked', () => {
  expect(isInstalled(locked, installed({ 'node_modules/a': a, 'node_modules/b': b }))).toBe(true)
})

it.each([
  ['is missing', { 'node_modules/a': a }],
  ['has another version', { 'node_modules/a': a, 'node_modules/b': { version: '2.0.9' } }],
  ['stands there unasked for', { 'node_modules/a': a, 'node_modules/b': b, 'node_modules/c': a }],
  [
    'is optional and has another version',
    { 'node_modules/a': a, 'node_modules/b': b, 'node_modules/b-darwin': a },
  ],
])('installs anew when a package %s', (_, packages) => {
  expect(isInstalled(locked, installed(packages))).toBe(false)
})
