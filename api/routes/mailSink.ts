import express from 'express'
import type { Router } from 'express'
import { notFound } from '../errors/problemError.ts'
import { escapeHtml } from '../mail/render.ts'
import type { CaughtMail, MailSink } from '../mail/sink.ts'

const STYLE = `
  :root { color-scheme: light dark; --ink: #201c26; --soft: #5e5767; --paper: #faf8f3; --rule: #ddd6c9; --ember: #b83a12 }
  @media (prefers-color-scheme: dark) {
    :root { --ink: #efeae1; --soft: #b2aabb; --paper: #141219; --rule: #332e3d; --ember: #ff8a55 }
  }
  body { margin: 0; background: var(--paper); color: var(--ink); font: 16px/1.5 sans-serif }
  main { max-width: 44rem; margin: 0 auto; padding: 1.5rem 1rem }
  a { color: var(--ember) }
  ul { list-style: none; padding: 0 }
  li { border-top: 1px solid var(--rule); padding: .75rem 0; overflow-wrap: anywhere }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit; border-top: 1px solid var(--rule); padding-top: 1rem }
  .soft { color: var(--soft); font-size: .875rem }`

const page = (title: string, body: string): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">
<title>${escapeHtml(title)} · Emberline</title><style>${STYLE}</style></head>
<body><main>${body}</main></body></html>`

const ADDRESS = /https?:\/\/[^\s<>&]+/g

const linked = (text: string): string =>
  escapeHtml(text).replaceAll(ADDRESS, (address) => `<a href="${address}">${address}</a>`)

const line = ({ id, at, to, subject }: CaughtMail): string =>
  `<li><a href="/mail/${id}">${escapeHtml(subject)}</a><br>
  <span class="soft">to ${escapeHtml(to)}, ${at.toISOString().slice(0, 19).replace('T', ' ')} UTC</span></li>`

const list = (mails: readonly CaughtMail[]): string =>
  page(
    'Mails',
    `<h1>Mails</h1><p class="soft">No mail server is set, so what the product sends is kept here and delivered to nobody.</p>
    ${mails.length === 0 ? '<p>Nothing has been sent yet. Invite somebody, or ask for a new password.</p>' : `<ul>${mails.map(line).join('')}</ul>`}`,
  )

const one = ({ id, from, to, subject, text }: CaughtMail): string =>
  page(
    subject,
    `<p><a href="/mail">All mails</a></p><h1>${escapeHtml(subject)}</h1>
    <p class="soft">from ${escapeHtml(from)}<br>to ${escapeHtml(to)}</p>
    <pre>${linked(text)}</pre><p class="soft"><a href="/mail/${id}/html">The HTML version</a></p>`,
  )

/** The pages on which the mails of the sink are read. Mounted only where there is a sink. */
export function mailSinkRoutes(sink: MailSink): Router {
  const router = express.Router()
  const found = (id: unknown): CaughtMail => {
    const mail = sink.mails().find((each) => String(each.id) === id)
    if (mail === undefined) throw notFound('mail')
    return mail
  }
  router.use((_req, res, next) => {
    res.setHeader('cache-control', 'no-store')
    next()
  })
  router.get('/', (_req, res) => void res.type('html').send(list(sink.mails())))
  router.get('/:id', (req, res) => void res.type('html').send(one(found(req.params.id))))
  router.get('/:id/html', (req, res) => void res.type('html').send(found(req.params.id).html))
  return router
}
