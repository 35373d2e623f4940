import { spawnSync } from 'node:child_process'
import { computeAbundance, computeSolve } from '#core/index'
import type { AttributeResult } from '#core/wire/index'
import { expect, it } from 'vitest'

const INPUT = {
  history: { bath: { treatment: 'fit-2018' }, neutrinos: { treatment: 'instantaneous' } },
  candidate: {
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    selfConjugate: true,
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26, pWaveCm3PerS: 0 },
  },
}

function compute(words: string[], input: string) {
  const run = spawnSync('npm', ['run', '--silent', 'compute', '--', ...words], { input, encoding: 'utf8' })
  return { status: run.status, stdout: run.stdout, stderr: run.stderr }
}

it('writes nothing but the result to standard output, and the numbers of the core', () => {
  const { status, stdout } = compute(['abundance'], JSON.stringify(INPUT))
  expect(status).toBe(0)
  expect(JSON.parse(stdout)).toEqual(computeAbundance(INPUT))
})

it('answers line by line, a fault in its place', () => {
  const { status, stdout } = compute(
    ['abundance', '--lines'],
    `${JSON.stringify(INPUT)}\n{}\n${JSON.stringify(INPUT)}\n`,
  )
  const [first, second, third, ...rest] = stdout
    .trimEnd()
    .split('\n')
    .map((line): unknown => JSON.parse(line))
  expect(status).toBe(0)
  expect(first).toEqual(computeAbundance(INPUT))
  expect(second).toMatchObject({ error: { name: 'InputError' } })
  expect(third).toEqual(first)
  expect(rest).toEqual([])
})

it('ends with status 2 on bad input, a line for each fault on standard error and nothing on standard output', () => {
  const faulty = { ...INPUT, candidate: { ...INPUT.candidate, massGeV: -1 } }
  const { status, stdout, stderr } = compute(['abundance'], JSON.stringify(faulty))
  expect({ status, stdout }).toEqual({ status: 2, stdout: '' })
  expect(stderr).toMatch(/^candidate\.massGeV: allowed: .*\(found -1\)$/m)
})

it('answers the inverse question and the attribution as the core does', () => {
  const inverse = { ...INPUT, solveFor: 'candidate.annihilation.sWaveCm3PerS', between: [1e-27, 1e-25] }
  expect(JSON.parse(compute(['solve'], JSON.stringify(inverse)).stdout)).toEqual(computeSolve(inverse))
  const change = {
    baseline: { bath: { treatment: 'thresholds' } },
    variant: { expansion: { kind: 'fluid', index: 2, equalityTemperatureGeV: 1.15 } },
    candidate: INPUT.candidate,
  }
  const { ratio, parts } = JSON.parse(
    compute(['attribute'], JSON.stringify(change)).stdout,
  ) as AttributeResult
  expect(parts.reduce((product, part) => product * part.factor, 1)).toBeCloseTo(ratio, 10)
})
