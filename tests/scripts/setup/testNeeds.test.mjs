import { expect, it } from 'vitest'
import { needsOf } from '../../../scripts/setup/testNeeds.mjs'

it.each([
  [[], { cluster: true, browser: true }],
  [['tests/core'], { cluster: false, browser: false }],
  [['./tests/core/wire', 'tests/web/bench.test.tsx'], { cluster: false, browser: false }],
  [['tests/core', 'tests/api'], { cluster: true, browser: false }],
  [['tests/e2e'], { cluster: true, browser: true }],
  [['tests/corelation'], { cluster: true, browser: true }],
  [['bench'], { cluster: true, browser: true }],
])('for the filters %j sets up %j', (filters, needs) => {
  expect(needsOf(filters)).toEqual(needs)
})
