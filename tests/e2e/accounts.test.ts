import { AxeBuilder } from '@axe-core/playwright'
import { mkdir } from 'node:fs/promises'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { codeAt } from '../support/oneTimeCode.ts'
import { startBrowser, startServer } from './server.ts'
import type { RunningServer } from './server.ts'

const PICTURES = 'dist/pictures'
const PASSWORD = 'four words nobody guesses'

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

const LOOKS = [
  { name: 'day', width: 1440, colorScheme: 'light' },
  { name: 'night-phone', width: 360, colorScheme: 'dark' },
] as const

async function freshPage(look: (typeof LOOKS)[number] = LOOKS[0]): Promise<Page> {
  const context = await browser.newContext({
    viewport: { width: look.width, height: 900 },
    colorScheme: look.colorScheme,
    reducedMotion: 'reduce',
  })
  return context.newPage()
}

async function signInAsDemo(page: Page, name: RegExp): Promise<void> {
  await page.goto(`${server.url}/sign-in`)
  await page.getByRole('button', { name }).click()
  await page.waitForURL(/\/bench/)
}

/** The link in the newest mail of the sink whose subject matches, read as a person would read it. */
async function linkInMail(subject: RegExp): Promise<string> {
  const page = await freshPage()
  await expect
    .poll(
      async () => {
        await page.goto(`${server.url}/mail`)
        return page.getByRole('link', { name: subject }).count()
      },
      { timeout: 15_000 },
    )
    .toBeGreaterThan(0)
  await page.getByRole('link', { name: subject }).first().click()
  const href = await page.locator('pre a').first().getAttribute('href')
  await page.context().close()
  return href ?? ''
}

async function lookOver(page: Page, name: string): Promise<void> {
  const overflow = await page.evaluate(
    'document.documentElement.scrollWidth - document.documentElement.clientWidth',
  )
  expect(overflow, name).toBeLessThanOrEqual(0)
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze()
  expect(
    violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 160)}`),
    name,
  ).toEqual([])
  await page.screenshot({ path: `${PICTURES}/${name}.png`, fullPage: true })
}

async function typeSignIn(page: Page, email: string, password: string): Promise<void> {
  await page.goto(`${server.url}/sign-in`)
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
}

describe('somebody new', () => {
  it('is invited by a lead, follows the link in the mail, and is in', async () => {
    const lead = await freshPage()
    await signInAsDemo(lead, /Noor/)
    await lead.getByRole('button', { name: /^Noor/ }).click()
    await lead.getByRole('link', { name: 'Invitations' }).click()
    await lead.getByLabel('E-mail').fill('ida@larchvalley.example')
    await lead.getByLabel('Role').selectOption('author')
    await lead.getByRole('button', { name: 'Send invitation' }).click()
    await lead.getByRole('button', { name: /Withdraw the invitation of ida/ }).waitFor()
    await lookOver(lead, 'invitations-day')

    const page = await freshPage()
    await page.goto(await linkInMail(/Noor Vestergaard invites you/))
    await page.getByText('invites you to Larch Valley group').waitFor()
    await page.getByLabel('Your name').fill('Ida Lindqvist')
    await page.getByLabel('Password').fill('password123')
    await page.getByRole('button', { name: 'Accept' }).click()
    await page.getByText('tried first').waitFor()
    expect(await page.getByLabel('Your name').inputValue()).toBe('Ida Lindqvist')
    await lookOver(page, 'invitation-day')
    await page.getByLabel('Password').fill(PASSWORD)
    await page.getByRole('button', { name: 'Accept' }).click()
    await page.waitForURL(/\/bench/)
    await page.getByRole('button', { name: /^Ida Lindqvist/ }).click()
    await page.getByText('author of Larch Valley group').waitFor()
    await page.getByRole('button', { name: 'Sign out' }).click()
    await page.waitForURL(/sign-in/)
    await typeSignIn(page, 'ida@larchvalley.example', PASSWORD)
    await page.waitForURL(/\/bench/)
    await lead.reload()
    await lead.getByText('accepted').waitFor()
  })
})

describe('a member', () => {
  it('sets up a second factor, is asked for it at the next sign-in, and gets in by a recovery code too', async () => {
    const page = await freshPage()
    await signInAsDemo(page, /Mateo/)
    await page.goto(`${server.url}/account`)
    await page.getByLabel('Password, to set up the second factor').fill('copper bridge lantern')
    await page.getByRole('button', { name: 'Set up a second factor' }).click()
    await page.getByAltText(/QR code/).waitFor()
    const secret = (await page.locator('code').first().textContent()) ?? ''
    await lookOver(page, 'second-factor-day')
    const now = Date.now()
    await page.getByLabel('Code the app shows').fill(codeAt(secret, now))
    await page.getByRole('button', { name: 'Put it in force' }).click()
    await page.getByText('Keep these recovery codes').waitFor()
    const codes = await page.locator('[role=status] li').allTextContents()
    expect(codes).toHaveLength(10)
    await lookOver(page, 'recovery-codes-day')
    await page.getByRole('button', { name: 'I have kept them' }).click()
    await page.getByText('10 recovery codes are left').waitFor()

    const other = await freshPage()
    await typeSignIn(other, 'mateo@larchvalley.example', 'copper bridge lantern')
    const code = other.getByLabel('Code of your second factor')
    await code.waitFor()
    await code.fill(codeAt(secret, now))
    await other.getByRole('button', { name: 'Sign in' }).click()
    await other.getByText('The code is not right').waitFor()
    await lookOver(other, 'sign-in-code-day')
    await code.fill(codeAt(secret, now + 30_000))
    await other.getByRole('button', { name: 'Sign in' }).click()
    await other.waitForURL(/\/bench/)

    const third = await freshPage()
    await typeSignIn(third, 'mateo@larchvalley.example', 'copper bridge lantern')
    await third.getByLabel('Code of your second factor').fill(codes[0] ?? '')
    await third.getByRole('button', { name: 'Sign in' }).click()
    await third.waitForURL(/\/bench/)

    await page.reload()
    await page.getByText('9 recovery codes are left').waitFor()
    await page.getByRole('button', { name: 'Sign out everywhere else' }).click()
    await page.getByText('Every other session has ended').waitFor()
    await other.goto(`${server.url}/histories`)
    await other.waitForURL(/sign-in/)
  })

  it('who forgot the password chooses a new one by the link in a mail', async () => {
    const page = await freshPage()
    await page.goto(`${server.url}/sign-in`)
    await page.getByRole('link', { name: 'Forgotten your password?' }).click()
    await page.getByLabel('E-mail').fill('hana@larchvalley.example')
    await page.getByRole('button', { name: 'Send the link' }).click()
    await page.getByText('a mail is on its way').waitFor()
    await page.goto(await linkInMail(/A new password/))
    await page.getByLabel('New password').fill(PASSWORD)
    await page.getByRole('button', { name: 'Use this password' }).click()
    await page.getByText('The new password holds').waitFor()
    await typeSignIn(page, 'hana@larchvalley.example', PASSWORD)
    await page.waitForURL(/\/bench/)
  })
})

describe('anyone', () => {
  it.each(LOOKS)('can use the pages of accounts by $name', async (look) => {
    const stranger = await freshPage(look)
    for (const path of [
      'sign-in',
      'forgotten-password',
      'reset-password#x',
      'confirm-email#x',
      'first-group#x',
    ]) {
      await stranger.goto(`${server.url}/${path}`)
      await stranger.getByRole('button').first().waitFor()
      await lookOver(stranger, `${path.replace('#x', '')}-${look.name}`)
    }
    await stranger.goto(`${server.url}/invitation#x`)
    await stranger.getByText('not valid any more').waitFor()
    await lookOver(stranger, `invitation-void-${look.name}`)
    await stranger.goto(`${server.url}/mail`)
    await lookOver(stranger, `mail-${look.name}`)

    const lead = await freshPage(look)
    await signInAsDemo(lead, /Noor/)
    for (const path of ['account', 'choose-group', 'invitations']) {
      await lead.goto(`${server.url}/${path}`)
      await lead.locator('main li').first().waitFor()
      await lookOver(lead, `${path}-${look.name}`)
    }
  })
})
