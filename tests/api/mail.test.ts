import { connect } from '#db/database'
import type { DatabaseConnection } from '#db/database'
import { jobQueue } from '#db/queue/jobQueue'
import type { JobQueue } from '#db/queue/jobQueue'
import { createLogger } from '#api/logger'
import { mailQueue, sendQueuedMail } from '#api/mail/mailQueue'
import { renderHtml, renderText } from '#api/mail/render'
import { smtpSender } from '#api/mail/sender'
import { startMailSink } from '#api/mail/sink'
import { sealer } from '#api/secrets/sealer'
import pg from 'pg'
import request from 'supertest'
import { SMTPServer } from 'smtp-server'
import type { AddressInfo } from 'node:net'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { freshDatabase } from '../support/database.ts'
import { until } from '../support/until.ts'
import { SESSION_SECRET, startHarness } from './support/harness.ts'
import type { Harness } from './support/harness.ts'

const MAIL = {
  to: 'hana@larchvalley.example',
  subject: 'An <invitation> & more',
  parts: [
    { text: 'Noor "N" <noor> invites you;\n5 > 3 & done.' },
    { label: 'Accept <it>', url: 'https://emberline.example/invitation#a&"b"' },
  ],
}

describe('a mail', () => {
  it('is plain text with the address on a line of its own', () => {
    expect(renderText(MAIL).split('\n')).toContain(MAIL.parts[1]?.url)
    expect(renderText(MAIL)).toContain('Noor "N" <noor> invites you;\n5 > 3 & done.')
  })

  it('is the same as HTML, in which no word becomes markup', () => {
    const html = renderHtml(MAIL)
    expect(html).toContain('<p>Noor &quot;N&quot; &lt;noor&gt; invites you;<br>5 &gt; 3 &amp; done.</p>')
    expect(html).toContain('<title>An &lt;invitation&gt; &amp; more</title>')
    expect(html).toContain('href="https://emberline.example/invitation#a&amp;&quot;b&quot;"')
    expect(html).not.toMatch(/<noor>|<it>|<invitation>/)
  })
})

describe('a sealed text', () => {
  it('opens with the same secret only, and not when altered', async () => {
    const { seal, open } = sealer(SESSION_SECRET)
    const sealed = await seal('a token')
    expect(sealed).not.toContain('token')
    expect(await open(sealed)).toBe('a token')
    expect(await seal('a token')).not.toBe(sealed)
    await expect(sealer(`${SESSION_SECRET}!`).open(sealed)).rejects.toThrow()
    const parts = sealed.split('.')
    parts[3] = Buffer.from('other text').toString('base64url')
    await expect(open(parts.join('.'))).rejects.toThrow()
  })
})

describe('mails in the queue', () => {
  let database: Awaited<ReturnType<typeof freshDatabase>>
  let connection: DatabaseConnection
  let queue: JobQueue
  let owner: pg.Client
  const seals = sealer(SESSION_SECRET)
  beforeAll(async () => {
    database = await freshDatabase()
    connection = connect(database.serverUrl, () => undefined)
    owner = new pg.Client({ connectionString: database.ownerUrl })
    await owner.connect()
  })
  beforeEach(async () => {
    await owner.query("delete from pgboss.job where name = 'mail'")
    queue = jobQueue(database.serverUrl, () => undefined)
    await queue.start()
    return () => queue.stop(1000)
  })
  afterAll(async () => {
    await connection.close()
    await owner.end()
    await database.drop()
  })

  const put = (mail = MAIL) => connection.db.transaction((tx) => mailQueue(queue, seals)(tx, mail))
  const states = async () =>
    (await owner.query<{ state: string }>("select state from pgboss.job where name = 'mail'")).rows.map(
      ({ state }) => state,
    )
  const sendTo = (url: string) =>
    sendQueuedMail(
      queue,
      seals,
      smtpSender(url, 'Emberline <noreply@emberline.example>'),
      createLogger('silent'),
    )

  it('tell whoever reads the database nothing', async () => {
    await put()
    const { rows } = await owner.query("select data::text from pgboss.job where name = 'mail'")
    expect(JSON.stringify(rows)).not.toMatch(/hana|invitation|noor/i)
  })

  it('arrive in both versions', async () => {
    const sink = await startMailSink()
    sendTo(sink.url)
    await put()
    await until(() => sink.mails().length === 1)
    const [mail] = sink.mails()
    expect(mail).toMatchObject({
      to: MAIL.to,
      subject: MAIL.subject,
      from: expect.stringContaining('noreply@emberline.example') as string,
    })
    expect(mail?.text).toContain(MAIL.parts[1]?.url)
    expect(mail?.html).toContain('Accept &lt;it&gt;')
    await sink.stop()
  })

  it('are delayed while the mail server is down, and none is lost', async () => {
    const first = await startMailSink()
    const port = Number(new URL(first.url).port)
    await first.stop()
    sendTo(first.url)
    for (const subject of ['one', 'two', 'three']) await put({ ...MAIL, subject })
    await until(async () => (await states()).filter((state) => state === 'retry').length === 3)
    const again = await startMailSink(port)
    await owner.query("update pgboss.job set start_after = now() where state = 'retry'")
    await until(() => again.mails().length === 3)
    await until(async () => (await states()).every((state) => state === 'completed'))
    expect(
      again
        .mails()
        .map(({ subject }) => subject)
        .sort(),
    ).toEqual(['one', 'three', 'two'])
    await again.stop()
  })

  it('refused for good are not tried again; refused for now are', async () => {
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ['STARTTLS', 'AUTH'],
      onRcptTo({ address }, _session, done) {
        const responseCode = address.startsWith('nobody') ? 550 : 450
        done(Object.assign(new Error('refused'), { responseCode }))
      },
    })
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', () => resolve()))
    sendTo(`smtp://127.0.0.1:${(server.server.address() as AddressInfo).port}`)
    await put({ ...MAIL, to: 'nobody@larchvalley.example' })
    await put({ ...MAIL, to: 'busy@larchvalley.example' })
    await until(async () => (await states()).sort().join() === 'completed,retry')
    await new Promise<void>((resolve) => server.close(() => resolve()))
  })
})

describe('the pages of the sink', () => {
  let harness: Harness
  beforeAll(async () => {
    harness = await startHarness()
    return () => harness.stop()
  })

  it('show what was sent, with no word of a mail taken for markup', async () => {
    const sink = await startMailSink()
    await smtpSender(sink.url, 'noreply@emberline.example').send(MAIL, 'some-id')
    const app = harness.appWith({ mailSink: sink })
    const list = await request(app).get('/mail')
    expect(list.text).toContain('An &lt;invitation&gt; &amp; more')
    const one = await request(app).get('/mail/1')
    expect(one.text).toContain('<a href="https://emberline.example/invitation#a')
    expect(one.text).not.toContain('<noor>')
    expect((await request(app).get('/mail/1/html')).text).toContain('Accept &lt;it&gt;')
    expect((await request(app).get('/mail/2')).status).toBe(404)
    await sink.stop()
  })

  it('are not there without a sink', async () => {
    expect((await request(harness.app).get('/mail')).text).not.toContain('Mails')
    expect((await request(harness.app).get('/mail/1')).status).toBe(404)
  })
})
