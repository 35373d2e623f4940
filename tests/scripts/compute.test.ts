import { spawn, spawnSync } from 'node:child_process'
import { once } from 'node:events'
import {
  computeAbundance,
  computeConversion,
  computeLaboratory,
  computePropagation,
  computeSolve,
} from '#core/index'
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

it('propagates, converts and checks measurements as the core does', () => {
  const uncertain = {
    ...INPUT,
    distributions: [{ path: 'candidate.massGeV', kind: 'normal', mean: 100, standardDeviation: 10 }],
    samples: 20,
    seed: 5,
  }
  expect(JSON.parse(compute(['propagate'], JSON.stringify(uncertain)).stdout)).toEqual(
    computePropagation(uncertain),
  )
  const moments = { from: { quantity: 'timeS', values: [1, 1e13] }, to: ['redshift', 'temperatureK'] }
  expect(JSON.parse(compute(['convert'], JSON.stringify(moments)).stdout)).toEqual(computeConversion(moments))
  const measured = {
    history: {},
    measured: {
      parentMassGeV: { value: 300, minus: 10, plus: 10 },
      lifetimeS: { value: 1e-9, minus: 2e-10, plus: 3e-10 },
      massGeV: { value: 1e-5, minus: 1e-6, plus: 1e-6 },
    },
    parent: { degreesOfFreedom: 1, statistics: 'boson' },
    samples: 20,
  }
  const { status, stdout } = compute(['laboratory', '--lines'], `${JSON.stringify(measured)}\n{}\n`)
  const [result, fault] = stdout
    .trimEnd()
    .split('\n')
    .map((line): unknown => JSON.parse(line))
  expect(status).toBe(0)
  expect(result).toEqual(JSON.parse(JSON.stringify(computeLaboratory(measured))))
  expect(fault).toMatchObject({
    error: { name: 'InputError', faults: [{ path: 'history' }, { path: 'measured' }, { path: 'parent' }] },
  })
})

it('ends at once with status 130 and no result when interrupted in a long computation', async () => {
  const long = {
    ...INPUT,
    distributions: [
      { path: 'candidate.massGeV', kind: 'log-normal', median: 100, standardDeviationOfLn: 0.5 },
    ],
    samples: 100_000,
  }
  const child = spawn('npm', ['run', '--silent', 'compute', '--', 'propagate', '--lines'], {
    stdio: ['pipe', 'pipe', 'inherit'],
    detached: true,
  })
  const written: string[] = []
  child.stdout.setEncoding('utf8').on('data', (chunk: string) => written.push(chunk))
  // The answer to a short question says that the command is at work.
  child.stdin.write(`${JSON.stringify({ ...long, samples: 10 })}\n`)
  await once(child.stdout, 'data')
  written.length = 0
  child.stdin.write(`${JSON.stringify(long)}\n`)
  await new Promise((resolve) => setTimeout(resolve, 300))
  const interrupted = performance.now()
  // A terminal sends Ctrl-C to the whole group.
  process.kill(-child.pid!, 'SIGINT')
  const [code] = (await once(child, 'exit')) as [number]
  expect(code).toBe(130)
  expect(written).toEqual([])
  // The computation alone would take ten seconds or more.
  expect(performance.now() - interrupted).toBeLessThan(5000)
})
