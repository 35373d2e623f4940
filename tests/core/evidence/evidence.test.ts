import { describe, expect, it } from 'vitest'
import { checkEvidence, computeAbundance, evidenceOf } from '#core/index'
import { abundanceRequest, digestOf } from '#core/wire/index'
import type { Evaluation, EvidenceBundle } from '#core/wire/index'

const input = abundanceRequest.parse({
  history: { bath: { treatment: 'thresholds' } },
  candidate: {
    mechanism: 'freeze-out',
    massGeV: 100,
    degreesOfFreedom: 2,
    statistics: 'fermion',
    annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26 },
  },
})
const id = '5f2b8c1e-7a64-4d0b-9a53-0c7d6c1f2a10'
const evaluation: Evaluation = {
  id,
  history: { id, number: 2, recordId: id, name: 'Steps' },
  candidate: { id, number: 1, recordId: id, name: 'WIMP' },
  author: { id, name: 'Somebody' },
  createdAt: '2026-10-01T09:20:00.000Z',
  coreVersion: '0.0.1',
  inputDigest: digestOf(input),
  result: computeAbundance(input),
}
/** As it comes out of a file. */
const bundle = () => JSON.parse(JSON.stringify(evidenceOf(evaluation, input, 'Larch'))) as EvidenceBundle

describe('evidence', () => {
  it('repeats from its own file: same digests, same number', () => {
    const check = checkEvidence(bundle())
    expect(check).toMatchObject({ digestsMatch: true, agrees: true, storedCoreVersion: '0.0.1' })
    expect(check.omegaH2).toBe(evaluation.result.omegaH2)
  })

  it('tells when an input was changed after the fact', () => {
    const changed = bundle()
    changed.input.candidate.massGeV = 101
    expect(checkEvidence(changed)).toMatchObject({ digestsMatch: false, agrees: false })
  })

  it('tells when the result was changed, however little', () => {
    const changed = bundle()
    changed.result.omegaH2 *= 1 + 1e-12
    expect(checkEvidence(changed)).toMatchObject({ digestsMatch: false, agrees: true })
  })

  it('refuses what is no bundle, with the path', () => {
    expect(() => checkEvidence({ ...bundle(), format: 'something else' })).toThrow('format')
    expect(() => checkEvidence(null)).toThrow()
  })
})
