import { describe, expect, it } from 'vitest'
import { verdict } from '../../../../web/src/components/charts/verdict.ts'

const MEASURED = { omegaH2: 0.12, standardError: 0.0012 }
const said = (omegaH2: number) => verdict(omegaH2, MEASURED)

describe('the verdict on an abundance', () => {
  it('tells percent and standard errors near the measured density', () => {
    expect(said(0.12216)).toEqual({ words: '1.8 % above, 1.8 σ', side: 'above' })
    expect(said(0.1188)).toEqual({ words: '1 % below, 1 σ', side: 'below' })
    expect(said(0.0336)).toEqual({ words: '72 % below, 72 σ', side: 'below' })
  })

  it('tells how many times above from a factor two on', () => {
    expect(said(0.2399).words).toMatch(/% above/)
    expect(said(0.24)).toEqual({ words: '2 times above', side: 'above' })
    expect(said(0.384).words).toBe('3.2 times above')
    expect(said(180).words).toBe('1,500 times above')
  })

  it('writes a power of ten when the factor is beyond counting', () => {
    expect(said(1.2e7).words).toBe('10⁸ times above')
    expect(said(1.2e-16).words).toBe('10¹⁵ times below')
  })

  it('never rounds what is left to a hundred percent below', () => {
    expect(said(0.00048).words).toBe('250 times below')
    expect(said(0).words).toBe('none left')
  })

  it('says as measured, on no side, when the digits agree', () => {
    expect(said(0.120001)).toEqual({ words: 'as measured', side: 'level' })
  })
})
