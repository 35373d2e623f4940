import { once } from 'node:events'
import { createServer } from 'node:net'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { anyFreePort, freePortFrom } from '../../../scripts/setup/freePort.mjs'

const LOOPBACK = '127.0.0.1'
let other

beforeEach(async () => {
  other = createServer()
  other.listen(0, LOOPBACK)
  await once(other, 'listening')
})

afterEach(() => other.close())

it('passes over a port that another program has', async () => {
  const taken = other.address().port
  expect(await freePortFrom(taken, LOOPBACK)).toBeGreaterThan(taken)
})

it('keeps to the wanted port when it is free', async () => {
  const free = await anyFreePort()
  expect(await freePortFrom(free, LOOPBACK)).toBe(free)
})
