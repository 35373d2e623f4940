import { createTransport } from 'nodemailer'
import type { Mail } from './mail.ts'
import { renderHtml, renderText } from './render.ts'

/** Hands mails to a mail server. */
export interface MailSender {
  /** `id` stays the same when a mail is sent again, so that it can be known as the same. Rejects when not taken. */
  send(mail: Mail, id: string): Promise<void>
}

/** A server slower than this is as good as down, milliseconds; together below what the queue allows a job. */
const TIMEOUTS = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 30_000 }

const domainOf = (from: string): string => /@([^@>\s]+)>?$/.exec(from)?.[1] ?? 'localhost'

/** Sends over SMTP: `url` is smtp://… (STARTTLS where the server offers it) or smtps://…, `from` who mails are from. */
export function smtpSender(url: string, from: string): MailSender {
  const parsed = new URL(url)
  const transport = createTransport({
    host: parsed.hostname,
    ...(parsed.port === '' ? {} : { port: Number(parsed.port) }),
    secure: parsed.protocol === 'smtps:',
    ...(parsed.username === ''
      ? {}
      : {
          auth: { user: decodeURIComponent(parsed.username), pass: decodeURIComponent(parsed.password) },
          // A password is never said in the clear.
          requireTLS: true,
        }),
    ...TIMEOUTS,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  return {
    async send(mail, id) {
      await transport.sendMail({
        from,
        to: mail.to,
        subject: mail.subject,
        text: renderText(mail),
        html: renderHtml(mail),
        messageId: `<${id}@${domainOf(from)}>`,
        headers: { 'Auto-Submitted': 'auto-generated' },
      })
    },
  }
}
