import { AxeBuilder } from '@axe-core/playwright'
import { execFile } from 'node:child_process'
import { mkdir, readFile } from 'node:fs/promises'
import { promisify } from 'node:util'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { EvidenceCheck } from '#core/wire/index'
import { startBrowser, startServer } from './server.ts'
import type { RunningServer } from './server.ts'

const PICTURES = 'dist/pictures'

let server: RunningServer
let browser: Browser
let author: Page
beforeAll(async () => {
  server = await startServer()
  browser = await startBrowser()
  await mkdir(PICTURES, { recursive: true })
  author = await cleanPage()
  await author.goto(`${server.url}/sign-in`)
  await author.getByRole('button', { name: /Mateo/ }).click()
  await author.waitForURL(/\/bench/)
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

/** A browser that has never been here. */
const cleanPage = async (options: { width?: number; night?: boolean } = {}): Promise<Page> =>
  (
    await browser.newContext({
      reducedMotion: 'reduce',
      viewport: { width: options.width ?? 1440, height: 900 },
      colorScheme: options.night ? 'dark' : 'light',
    })
  ).newPage()

/** Makes a link on the page that is open, and reads it off the dialog. */
async function makeLink(note: string): Promise<string> {
  await author.getByRole('button', { name: 'New guest link' }).click()
  await author.getByLabel('Whom it is for').fill(note)
  await author.getByRole('button', { name: 'Make the link' }).click()
  const shown = author.getByRole('dialog').locator('code').first()
  await shown.waitFor()
  const address = (await shown.textContent()) ?? ''
  await author.getByRole('button', { name: 'I have it' }).click()
  return address
}

async function openFirst(list: string): Promise<void> {
  await author.goto(`${server.url}/${list}`)
  await author.locator('main td a[href]').first().click()
  await author.getByRole('button', { name: 'New guest link' }).waitFor()
}

async function repeat(file: string): Promise<EvidenceCheck> {
  const child = promisify(execFile)(process.execPath, ['scripts/compute.mjs', 'evidence'])
  child.child.stdin!.end(await readFile(file))
  return JSON.parse((await child).stdout) as EvidenceCheck
}

describe('a guest', () => {
  it('sees an evaluation in a clean browser, recomputes it, takes the evidence, and no longer once it is revoked', async () => {
    await openFirst('evaluations')
    const address = await makeLink('the referee')
    const guest = await cleanPage()
    const asked: string[] = []
    guest.on('request', (request) => asked.push(request.url()))
    await guest.goto(address)
    await guest.getByRole('button', { name: 'Recompute here' }).click()
    await guest.getByText('It agrees.').waitFor()

    const download = guest.waitForEvent('download')
    await guest.getByRole('button', { name: 'Save the evidence' }).click()
    const check = await repeat(await (await download).path())
    expect(check).toMatchObject({ digestsMatch: true, agrees: true })

    // The token never stands in an address that is asked for.
    const token = address.split('#')[1]!
    expect(asked.filter((url) => url.includes(token))).toEqual([])

    await author.reload()
    await author.getByRole('button', { name: 'Revoke the link the referee' }).click()
    await author.getByText('revoked').first().waitFor()
    await guest.reload()
    await guest.getByText('This link opens nothing').first().waitFor()
    expect(await guest.getByText('It agrees.').count()).toBe(0)
  })

  it('sees one revision of a history and is led nowhere else', async () => {
    await openFirst('histories')
    const guest = await cleanPage()
    await guest.goto(await makeLink('a collaborator'))
    await guest.getByRole('heading', { name: 'Assumptions' }).waitFor()
    const links = await guest.locator('a[href]').evaluateAll((all) => all.map((a) => a.getAttribute('href')))
    expect(links.filter((href) => href !== '/' && href !== '/bench')).toEqual([])
  })

  it.each([
    ['by day on a wide screen', {}],
    ['by night on a phone', { width: 360, night: true }],
  ])('finds the page readable %s', async (name, options) => {
    await openFirst('evaluations')
    const address = await makeLink(`picture ${name}`)
    const guest = await cleanPage(options)
    await guest.goto(address)
    await guest.getByRole('button', { name: 'Recompute here' }).waitFor()
    const overflow = await guest.evaluate(
      'document.documentElement.scrollWidth - document.documentElement.clientWidth',
    )
    expect(overflow).toBeLessThanOrEqual(0)
    const { violations } = await new AxeBuilder({ page: guest })
      .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
      .analyze()
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 160)}`)).toEqual([])
    await guest.screenshot({ path: `${PICTURES}/guest-${name.replace(/ /g, '-')}.png`, fullPage: true })
  })
})
