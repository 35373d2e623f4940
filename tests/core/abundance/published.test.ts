import { describe, expect, it } from 'vitest'
import { computeAbundance } from '#core/index'
import { HBARC_GEV_CM, HBAR_GEV_S, PLANCK_MASS_GEV } from '#core/constants/natural'
import { ownValue, publishedFixture, relative } from '../fixtures.ts'
import type { CrossSectionsForDensity } from '../fixtures.ts'

/** Textbook steps hold g = 106.75 above 172.57 GeV, so that heavy scales meet the closed forms. */
const STEPS = { bath: { treatment: 'thresholds' } }
const G = 106.75

const particle = { degreesOfFreedom: 2, statistics: 'fermion' }
const sWave = (massGeV: number, sWaveCm3PerS: number) => ({
  mechanism: 'freeze-out',
  massGeV,
  ...particle,
  annihilation: { kind: 'partial-waves', sWaveCm3PerS },
})
const yieldOf = (history: unknown, candidate: unknown): number =>
  computeAbundance({ history, candidate }).yieldToday
const omega = (history: unknown, candidate: unknown): number =>
  computeAbundance({ history, candidate }).omegaH2

const nameOf = ({ bath, neutrinos }: CrossSectionsForDensity): string => `${bath}, ${neutrinos} neutrinos`

describe('cross-sections for Ωh² = 0.11', () => {
  it.each(publishedFixture.sdb12.map((each) => [nameOf(each), each] as const))(
    'of independent code give it back to 1e-6: %s',
    (_name, { bath, neutrinos, omegaH2, sigmaVCm3PerS }) => {
      const history = { bath: { treatment: bath }, neutrinos: { treatment: neutrinos } }
      for (const [mass, sigmaV] of Object.entries(sigmaVCm3PerS))
        expect(relative(omega(history, sWave(Number(mass), sigmaV)), omegaH2), `m = ${mass}`).toBeLessThan(
          1e-6,
        )
    },
  )

  it('are those of Steigman, Dasgupta, Beacom, PRD 86 (2012) 023506, 5.2e-26 at 0.3 GeV and 2.2e-26 far above 10 GeV, but for the bath', () => {
    const { sigmaVCm3PerS } = publishedFixture.sdb12.find(
      (each) => each.bath === 'fit-2018' && each.neutrinos === 'instantaneous',
    )!
    // Their bath predates the lattice determinations: 4 to 5 %.
    expect(relative(sigmaVCm3PerS['0.3']!, 5.2e-26)).toBeLessThan(0.05)
    expect(relative(sigmaVCm3PerS['100']!, 2.2e-26)).toBeLessThan(0.05)
  })
})

describe('closed forms at constant g', () => {
  const prefactor = Math.sqrt((4 * Math.PI ** 3) / 45)

  it('freeze-in by decay: Y = 135 g_B M_Pl Γ/(1.66·8π³ g_s √g_ρ m_B²) (Hall et al., JHEP 03 (2010) 080, eq. 6.8)', () => {
    const [massGeV, lifetimeS] = [1e6, 1e-12]
    const parent = { massGeV, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', lifetimeS }
    const candidate = { mechanism: 'freeze-in-decay', massGeV: 1, ...particle, parent }
    const closed =
      (135 * PLANCK_MASS_GEV * (HBAR_GEV_S / lifetimeS)) /
      (prefactor * 8 * Math.PI ** 3 * G ** 1.5 * massGeV ** 2)
    // What is missing above x = 1e-5 and below x = 45 is 1e-14 of it; the rest is quadrature.
    expect(relative(yieldOf(STEPS, candidate), closed)).toBeLessThan(1e-9)
  })

  it('freeze-in by collisions of constant |M|²: Y = 45 |M|² M_Pl/(1.66·512π⁶ g^{3/2} m) (Hall et al., JHEP 03 (2010) 080, §3)', () => {
    const [massGeV, matrixElementSquared] = [1e6, 1e-18]
    const scattering = { kind: 'constant-matrix-element', matrixElementSquared }
    const candidate = { mechanism: 'freeze-in-scattering', massGeV, ...particle, scattering }
    // γ = |M|² m T³ K₁/(128π⁵);  Y = ∫ γ/(sH) dx/x, and ∫ x K₁ dx = π/2.
    const closed =
      ((matrixElementSquared / (128 * Math.PI ** 5)) * 45 * PLANCK_MASS_GEV * (Math.PI / 2)) /
      (2 * Math.PI ** 2 * prefactor * G ** 1.5 * massGeV)
    // Collisions begin at 9e15 GeV, x = 1e-10: the tail before is linear in it.
    expect(relative(yieldOf(STEPS, candidate), closed)).toBeLessThan(1e-9)
  })

  it.each([
    [1, 2e-5],
    [2, 1e-9],
  ])(
    'ultraviolet freeze-in with q = %i: Y = 45 C M_Pl T_max^{2q−1}/(1.66·2π² g^{3/2} (2q−1) Λ^{2q}) (Elahi, Kolda, Unwin, JHEP 03 (2015) 048)',
    (index, belowTheSteps) => {
      const [coefficient, scaleGeV, maximumTemperatureGeV] = [1e-3, 1e13, 1e8]
      const ultraviolet = { coefficient, scaleGeV, index }
      const candidate = { mechanism: 'freeze-in-ultraviolet', massGeV: 1, ...particle, ultraviolet }
      const closed =
        (45 * coefficient * PLANCK_MASS_GEV * maximumTemperatureGeV ** (2 * index - 1)) /
        (2 * Math.PI ** 2 * prefactor * G ** 1.5 * (2 * index - 1) * scaleGeV ** (2 * index))
      // Below 172.57 GeV g is smaller; the share made there is (172.57/1e8)^{2q−1} times at most (106.75/3.9)^{3/2}.
      expect(relative(yieldOf({ ...STEPS, maximumTemperatureGeV }, candidate), closed)).toBeLessThan(
        belowTheSteps,
      )
    },
  )

  it.each([1, 2, 4])(
    'freeze-in by decay while a fluid ρ ∝ a^{−(4+%i)} runs the expansion (D’Eramo, Fernandez, Profumo, JCAP 05 (2017) 012)',
    (index) => {
      const [massGeV, lifetimeS, equality] = [1e9, 1e-10, 1e3]
      const parent = { massGeV, degreesOfFreedom: 1, statistics: 'maxwell-boltzmann', lifetimeS }
      const candidate = { mechanism: 'freeze-in-decay', massGeV: 1e-3, ...particle, parent }
      const expansion = { kind: 'fluid', index, equalityTemperatureGeV: equality }
      // H = H_R(T_r)(T/T_r)^{2+n/2} and ∫ x^{3+n/2} K₁ dx = 2^{2+n/2} Γ((5+n/2)/2) Γ((3+n/2)/2): DLMF 10.43.19.
      const integral =
        2 ** (2 + index / 2) * gammaFunction((5 + index / 2) / 2) * gammaFunction((3 + index / 2) / 2)
      const closed =
        (((HBAR_GEV_S / lifetimeS / (2 * Math.PI ** 2)) * 45 * PLANCK_MASS_GEV * integral) /
          (2 * Math.PI ** 2 * prefactor * G ** 1.5 * massGeV ** 2)) *
        (equality / massGeV) ** (index / 2)
      // Radiation adds (T_r/T)^n/2 to H: 2e-5 for n = 1 where production is, m_B/3.
      expect(relative(yieldOf({ ...STEPS, expansion }, candidate), closed)).toBeLessThan(2e-5)
    },
  )
})

/** Γ at multiples of 1/4, by its recurrence and values of DLMF 5.4 and OEIS A068466, A068465. */
function gammaFunction(z: number): number {
  if (z > 1.75) return (z - 1) * gammaFunction(z - 1)
  const known: Record<string, number> = {
    '1': 1,
    '1.25': 0.25 * 3.625609908221908,
    '1.5': Math.sqrt(Math.PI) / 2,
    '1.75': 0.75 * 1.225416702465178,
  }
  return known[String(z)]!
}

describe('published numbers', () => {
  it('Ωh² = 2.744e8 (m/GeV) Y₀ for g_s = 43/11 (Kolb & Turner §5.2 with present constants)', () => {
    const history = { neutrinos: { treatment: 'instantaneous' } }
    const { omegaH2, yieldToday } = computeAbundance({ history, candidate: sWave(100, 2.2e-26) })
    expect(relative(omegaH2 / (100 * yieldToday), 2.744e8)).toBeLessThan(1e-5)
    expect(relative(omegaH2 / (100 * yieldToday), ownValue('omegaH2/(m Y0) per GeV'))).toBeLessThan(1e-12)
  })

  it('a neutrino that lets go while all electrons are there has Ωh² = m/(94.1 eV) (PDG)', () => {
    const candidate = { mechanism: 'hot-relic', massGeV: 1e-9, ...particle, decouplingTemperatureGeV: 0.01 }
    const history = {
      bath: { treatment: 'thresholds' },
      neutrinos: { treatment: 'instantaneous', decouplingTemperatureGeV: 0.002 },
    }
    // Steps hold g_s = 10.75 exactly at 10 MeV, and 43/11 today.
    const own = ownValue('sum m_nu/(omegaH2) in eV, N_eff=3 instantaneous')
    expect(relative(1 / omega(history, candidate), own)).toBeLessThan(1e-9)
  })

  it.each([
    [0.12, true, 2, 'unitarity limit in GeV, omegaH2 = 0.12, self-conjugate g=2'],
    [1, false, 4, 'unitarity limit in GeV, omegaH2 = 1, Dirac (g=4 both, half rate)'],
  ])(
    'unitarity ends thermal relics at Ωh² = %f of the order of 100 TeV, as independent code has (Griest & Kamionkowski 1990)',
    (omegaH2, selfConjugate, degreesOfFreedom, name) => {
      const massGeV = ownValue(name)
      // ⟨σv⟩ = (4π/m²)⟨1/v⟩ with ⟨1/v⟩ = √(x/π): a power law.
      const inGeV = (4 * Math.PI) / massGeV ** 2 / Math.sqrt(Math.PI)
      const coefficientCm3PerS = (inGeV * HBARC_GEV_CM ** 3) / HBAR_GEV_S
      const candidate = {
        ...sWave(massGeV, 1),
        degreesOfFreedom,
        selfConjugate,
        annihilation: { kind: 'power-law', coefficientCm3PerS, exponent: -0.5 },
      }
      // The reference found ln m to 1e-7, and Ωh² goes as its square.
      expect(relative(omega(STEPS, candidate), omegaH2)).toBeLessThan(1e-6)
    },
  )
})
