import { AxeBuilder } from '@axe-core/playwright'
import { execFile } from 'node:child_process'
import { mkdir } from 'node:fs/promises'
import { promisify } from 'node:util'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { historyInput } from '#core/wire/index'
import { startBrowser, startServer } from './server.ts'
import type { RunningServer } from './server.ts'

/** 100 GeV self-conjugate fermion with ⟨σv⟩ = 2.2e-26 cm³/s. */
const WIMP = {
  mechanism: 'freeze-out',
  massGeV: 100,
  degreesOfFreedom: 2,
  statistics: 'fermion',
  selfConjugate: true,
  annihilation: { kind: 'partial-waves', sWaveCm3PerS: 2.2e-26, pWaveCm3PerS: 0 },
}

/** Where pictures of the pages are left to be looked at; not part of the repository but for the README's. */
const PICTURES = 'dist/pictures'

let server: RunningServer
let browser: Browser

beforeAll(async () => {
  server = await startServer()
  browser = await startBrowser()
  await mkdir(PICTURES, { recursive: true })
})

afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

async function openPage(
  options: { width?: number; height?: number; night?: boolean } = {},
): Promise<{ page: Page; complaints: string[] }> {
  const { width = 1440, height = 980, night = false } = options
  const context = await browser.newContext({
    viewport: { width, height },
    colorScheme: night ? 'dark' : 'light',
    reducedMotion: 'reduce',
  })
  const page = await context.newPage()
  const complaints: string[] = []
  page.on('pageerror', (error) => complaints.push(error.message))
  page.on('console', (message) => {
    // Asking who is signed in is answered with 401 to a stranger, which the browser calls an error.
    if (message.type() === 'error' && !message.text().includes('401')) complaints.push(message.text())
  })
  return { page, complaints }
}

async function signIn(page: Page, name: RegExp): Promise<void> {
  await page.goto(`${server.url}/sign-in`)
  await page.getByRole('button', { name }).click()
  await page.waitForURL(/\/bench/)
}

/** Ω_χh² at full precision, once it differs from what stood there. */
async function abundanceShown(page: Page, before?: number): Promise<number> {
  const output = page.getByTestId('omega')
  await output.waitFor()
  await expect
    .poll(async () => Number(await output.getAttribute('data-value')), { timeout: 10_000 })
    .not.toBe(before ?? 0)
  return Number(await output.getAttribute('data-value'))
}

async function saveEvaluation(page: Page, note: string): Promise<void> {
  await page.getByRole('button', { name: /^Save (revision|evaluation)$/ }).click()
  const noteField = page.getByLabel('Note')
  if (await noteField.count()) await noteField.fill(note)
  await page.getByRole('button', { name: 'Save', exact: true }).click()
  await page.getByText('Evaluation stored.').last().waitFor()
  await page.getByRole('dialog').waitFor({ state: 'detached' })
}

async function computed(history: unknown): Promise<number> {
  const child = promisify(execFile)(process.execPath, ['scripts/compute.mjs', 'abundance'])
  child.child.stdin!.end(JSON.stringify({ history, candidate: WIMP }))
  return (JSON.parse((await child).stdout) as { omegaH2: number }).omegaH2
}

async function fromApi(page: Page, history: unknown): Promise<number> {
  const response = await page.request.post(`${server.url}/api/v1/compute/abundance`, {
    data: { history, candidate: WIMP },
    headers: { 'content-type': 'application/json' },
  })
  return ((await response.json()) as { omegaH2: number }).omegaH2
}

describe('an author', () => {
  it('sees what the bath does to the abundance, stores both numbers, and finds them again after signing in anew', async () => {
    const { page, complaints } = await openPage()
    await signIn(page, /Mateo/)

    await page.getByLabel('Candidate on the Bench').selectOption({ label: 'Standard WIMP, 100 GeV' })
    await page.getByLabel('History on the Bench').selectOption({ label: 'Kination until 1.15 GeV' })
    await page.getByText('fluid equals radiation').waitFor()
    await page.screenshot({ path: `${PICTURES}/readme.png` })
    await page.getByLabel('History on the Bench').selectOption({ label: '2018 fit with its band' })
    await page.getByText('fluid equals radiation').waitFor({ state: 'detached' })
    const withFit = await abundanceShown(page)
    await expect.poll(() => page.url()).toContain('history=')

    // Each line shows its own factor against the baseline before anything is changed.
    const bathLine = page.getByRole('button', { name: /^Bath/ })
    expect(await bathLine.textContent()).toMatch(/× 0\.9\d+/)
    await saveEvaluation(page, '')

    await bathLine.click()
    await page.getByLabel('Treatment').selectOption({ label: 'textbook steps' })
    const withSteps = await abundanceShown(page, withFit)
    await saveEvaluation(page, 'Textbook steps, to see what the fit does')

    // The same two numbers by the server and by the command, to 1e-9.
    const fit = historyInput.parse({ bath: { treatment: 'fit-2018' } })
    const steps = historyInput.parse({ bath: { treatment: 'thresholds' } })
    for (const [shown, input] of [
      [withFit, fit],
      [withSteps, steps],
    ] as const) {
      expect(Math.abs((await fromApi(page, input)) / shown - 1)).toBeLessThan(1e-9)
      expect(Math.abs((await computed(input)) / shown - 1)).toBeLessThan(1e-9)
    }

    await page.getByText('Mateo Adeyemi').first().click()
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL(/sign-in/)
    await page.goto(`${server.url}/evaluations`)
    await page.waitForURL(/sign-in/)

    await page.getByLabel('E-mail').fill('mateo@larchvalley.example')
    await page.getByLabel('Password').fill('copper bridge lantern')
    await page.getByRole('button', { name: 'Sign in' }).click()
    await page.waitForURL(/evaluations/)
    await page.getByRole('cell').first().waitFor()
    const listed = await page.evaluate<number[]>(
      "[...document.querySelectorAll('td [title]')].map((cell) => Number(cell.title))",
    )
    for (const shown of [withFit, withSteps])
      expect(
        listed.some((number) => Math.abs(number / shown - 1) < 1e-9),
        `${shown} among ${listed.join()}`,
      ).toBe(true)
    expect(complaints).toEqual([])
    await page.context().close()
  })

  it('is told beside the field what is wrong, keeps what was typed, and keeps the last good number', async () => {
    const { page } = await openPage()
    await signIn(page, /Mateo/)
    const before = await abundanceShown(page)
    const mass = page.getByLabel('Mass', { exact: true })
    await mass.fill('heavy')
    await page.getByText('“heavy” does not begin with a number').waitFor()
    expect(await mass.inputValue()).toBe('heavy')
    await mass.fill('-5')
    await page.getByText('allowed: above 0').first().waitFor()
    expect(await abundanceShown(page)).toBe(before)
    await mass.fill('0.25 TeV')
    expect(await abundanceShown(page, before)).toBeGreaterThan(0)
    await page.context().close()
  })

  it('finds the Bench as it was left after a reload', async () => {
    const { page } = await openPage()
    await signIn(page, /Mateo/)
    const before = await abundanceShown(page)
    await page.getByLabel('Mass', { exact: true }).fill('321')
    const changed = await abundanceShown(page, before)
    await expect.poll(() => page.url(), { timeout: 10_000 }).toContain('draft=')
    await page.reload()
    expect(await abundanceShown(page)).toBe(changed)
    expect(await page.getByLabel('Mass', { exact: true }).inputValue()).toBe('321')
    await page.context().close()
  })
})

describe('a reader', () => {
  it('computes freely and is told why nothing can be saved', async () => {
    const { page } = await openPage()
    await signIn(page, /Hana/)
    await abundanceShown(page)
    expect(await page.getByRole('button', { name: /^Save/ }).isDisabled()).toBe(true)
    await page.getByText('Readers compute freely').waitFor()
    await page.context().close()
  })
})

describe('anyone', () => {
  const PAGES = ['/bench', '/histories', '/candidates', '/evaluations', '/keys', '/audit', '/reference']

  it.each([
    ['by day on a wide screen', { width: 1440 }],
    ['by night on a wide screen', { width: 1440, night: true }],
    ['by day on a phone', { width: 360, height: 740 }],
    ['by night on a phone', { width: 360, height: 740, night: true }],
  ])(
    'can use every page %s: nothing runs out of the screen, and the accessibility rules hold',
    async (name, options) => {
      const { page, complaints } = await openPage(options)
      await signIn(page, /Noor/)
      for (const path of PAGES) {
        await page.goto(`${server.url}${path}`)
        await page.getByRole('main').waitFor()
        if (path === '/bench') await abundanceShown(page)
        else await page.locator('main table, main a[href]').first().waitFor()
        const overflow = await page.evaluate(
          'document.documentElement.scrollWidth - document.documentElement.clientWidth',
        )
        expect(overflow, `${path} ${name}`).toBeLessThanOrEqual(0)
        const { violations } = await new AxeBuilder({ page })
          .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
          .analyze()
        expect(
          violations.map((violation) => `${violation.id}: ${violation.nodes[0]?.html.slice(0, 160)}`),
          `${path} ${name}`,
        ).toEqual([])
        await page.screenshot({ path: `${PICTURES}${path}-${name.replace(/ /g, '-')}.png`, fullPage: true })
      }
      expect(complaints).toEqual([])
      await page.context().close()
    },
  )
})
