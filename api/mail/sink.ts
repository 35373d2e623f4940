import type { AddressInfo } from 'node:net'
import { simpleParser } from 'mailparser'
import { SMTPServer } from 'smtp-server'

export interface CaughtMail {
  id: number
  at: Date
  to: string
  from: string
  subject: string
  text: string
  html: string
}

/** A mail server that delivers nothing and keeps the newest mails to be read on a page: for demo and development. */
export interface MailSink {
  url: string
  /** Newest first. */
  mails(): readonly CaughtMail[]
  stop(): Promise<void>
}

const KEPT = 200
const LARGEST_BYTES = 1_048_576

/** Listens on loopback, on `port` or any free one. */
export async function startMailSink(port = 0): Promise<MailSink> {
  const mails: CaughtMail[] = []
  let count = 0
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    size: LARGEST_BYTES,
    onData(stream, session, done) {
      simpleParser(stream).then(({ from, subject, text, html }) => {
        count += 1
        mails.unshift({
          id: count,
          at: new Date(),
          to: session.envelope.rcptTo.map(({ address }) => address ?? '').join(', '),
          from: from?.text ?? '',
          subject: subject ?? '',
          text: text ?? '',
          html: html || '',
        })
        mails.splice(KEPT)
        done()
      }, done)
    },
  })
  // A client that hangs up is none of the product's business.
  server.on('error', () => undefined)
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', () => resolve())
  })
  const { port: chosen } = server.server.address() as AddressInfo
  return {
    url: `smtp://127.0.0.1:${chosen}`,
    mails: () => mails,
    stop: () => new Promise((resolve) => server.close(() => resolve())),
  }
}
