import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import type { Express } from 'express'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'
import { expectProblem } from './support/problems.ts'

let harness: Harness
let webRoot: string
let app: Express
beforeAll(async () => {
  harness = await startHarness()
  webRoot = await mkdtemp(join(tmpdir(), 'emberline-web-'))
  await mkdir(join(webRoot, 'assets'))
  await writeFile(join(webRoot, 'index.html'), '<!doctype html><title>Emberline</title>')
  await writeFile(join(webRoot, 'assets', 'main-4f2a.js'), `export const text = '${'ember '.repeat(500)}'`)
  app = harness.appWith({ webRoot })
})
afterAll(async () => {
  await harness.stop()
  await rm(webRoot, { recursive: true })
})

describe('the web app', () => {
  it.each(['/', '/histories', '/histories/5f2b8c1e-7a64-4d0b-9a53-0c7d6c1f2a10?tab=notes'])(
    'answers the page %s with index.html, asked afresh each time',
    async (address) => {
      const answer = await request(app).get(address)
      expect(answer.status).toBe(200)
      expect(answer.text).toContain('<title>Emberline</title>')
      expect(answer.headers['cache-control']).toBe('no-cache')
    },
  )

  it('serves hashed assets compressed, to be kept for ever', async () => {
    const answer = await request(app).get('/assets/main-4f2a.js').set('Accept-Encoding', 'gzip')
    expect(answer.status).toBe(200)
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable')
    expect(answer.headers['content-encoding']).toBe('gzip')
  })

  it('does not answer a missing asset with a page', async () => {
    expectProblem(await request(app).get('/assets/gone-1a2b.js'), 'not-found')
  })

  it('does not serve files outside its folder', async () => {
    const answer = await request(app).get('/assets/..%2f..%2f..%2fetc/passwd')
    expect(answer.text).not.toContain('root:')
    expectProblem(answer, 'not-found')
  })

  it('answers with a problem, not a path, when it has not been built', async () => {
    const answer = await request(harness.app).get('/histories')
    expectProblem(answer, 'not-found')
    expect(answer.text).not.toContain('no-such-folder')
  })
})
