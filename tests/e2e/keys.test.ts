import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { callsByTag, takesKey } from '../../web/src/features/reference/apiDocument.ts'
import type { ApiDocument, Call } from '../../web/src/features/reference/apiDocument.ts'
import { KEY_VARIABLE, curlSnippet, pythonSnippet } from '../../web/src/features/reference/snippets.ts'
import { startBrowser, startServer } from './server.ts'
import type { RunningServer } from './server.ts'

const run = promisify(execFile)

let server: RunningServer
let browser: Browser
let page: Page
let secret: string

beforeAll(async () => {
  server = await startServer()
  browser = await startBrowser()
  page = await (await browser.newContext({ reducedMotion: 'reduce' })).newPage()
  await page.goto(`${server.url}/sign-in`)
  await page.getByRole('button', { name: /Mateo/ }).click()
  await page.waitForURL(/\/bench/)
  secret = await makeKey('For the examples', 'write')
})
afterAll(async () => {
  await browser?.close()
  await server?.stop()
})

/** Makes a key on its page and reads the secret off the dialog, as a person does. */
async function makeKey(name: string, scope: string): Promise<string> {
  await page.goto(`${server.url}/keys`)
  await page.getByRole('button', { name: 'New key' }).click()
  await page.getByLabel('What it is for').fill(name)
  await page.getByLabel('It may').selectOption(scope)
  await page.getByRole('button', { name: 'Make the key' }).click()
  const shown = page.getByRole('dialog').locator('code').first()
  await shown.waitFor()
  const text = (await shown.textContent()) ?? ''
  await page.getByRole('button', { name: 'I have it' }).click()
  return text
}

const withKey = (program: string, args: string[], key = secret) =>
  run(program, args, { env: { ...process.env, [KEY_VARIABLE]: key } })

const inShell = (script: string, key?: string) => withKey('/bin/sh', ['-c', script], key)

async function callOf(operationId: string): Promise<Call> {
  const answer = await fetch(`${server.url}/api/openapi.json`)
  const calls = [...callsByTag((await answer.json()) as ApiDocument).values()].flat()
  const call = calls.find(({ operation }) => operation.operationId === operationId)
  if (call === undefined) throw new Error(`the API has no ${operationId}`)
  expect(takesKey(call)).toBe(true)
  return call
}

describe('the examples of the API reference, run as they stand there', () => {
  it.each(['listHistoryRecords', 'computeAbundance', 'createCandidate'])('%s, by curl', async (id) => {
    const { stdout } = await inShell(curlSnippet(await callOf(id), server.url))
    expect(typeof JSON.parse(stdout)).toBe('object')
  })

  it.each(['listHistoryRecords', 'computeAbundance', 'createHistory'])('%s, in Python', async (id) => {
    const { stdout } = await withKey('/usr/bin/python3', ['-c', pythonSnippet(await callOf(id), server.url)])
    expect(typeof JSON.parse(stdout)).toBe('object')
  })

  it('give the number the page shows', async () => {
    const call = await callOf('computeAbundance')
    const byCurl = JSON.parse((await inShell(curlSnippet(call, server.url))).stdout) as { omegaH2: number }
    const python = ['-c', pythonSnippet(call, server.url)]
    const byPython = JSON.parse((await withKey('/usr/bin/python3', python)).stdout) as { omegaH2: number }
    expect(byCurl.omegaH2).toBeGreaterThan(0.1)
    expect(byPython.omegaH2).toBe(byCurl.omegaH2)
  })

  it('stand on the page', async () => {
    await page.goto(`${server.url}/reference`)
    await page.getByText('/compute/abundance').click()
    const shown = page.getByLabel('In curl')
    await shown.waitFor()
    expect(await shown.textContent()).toBe(curlSnippet(await callOf('computeAbundance'), server.url))
  })
})

describe('a key', () => {
  it('is refused by curl once it is revoked on its page', async () => {
    const other = await makeKey('To be revoked', 'read')
    const ask = curlSnippet(await callOf('listHistoryRecords'), server.url)
    await inShell(ask, other)
    await page.getByRole('button', { name: 'Revoke To be revoked' }).click()
    await page.getByRole('button', { name: 'Revoke', exact: true }).click()
    await page.getByText('“To be revoked” is revoked.').waitFor()
    await expect(inShell(ask, other)).rejects.toMatchObject({ stdout: expect.stringContaining('bad-key') })
  })
})
