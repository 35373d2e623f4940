import type { Mail, MailPart } from './mail.ts'

const SIGNATURE = 'Emberline'

/** The mail for those who read plain text: addresses stand on lines of their own. */
export function renderText({ parts }: Mail): string {
  const lines = parts.map((part) => ('text' in part ? part.text : `${part.label}:\n${part.url}`))
  return `${[...lines, `-- \n${SIGNATURE}`].join('\n\n')}\n`
}

const ENTITIES: Record<string, string> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

/** Text as HTML, within elements and within quoted attributes. */
export const escapeHtml = (text: string): string =>
  text.replaceAll(/[&<>"']/g, (sign) => ENTITIES[sign] ?? '')

const BUTTON =
  'display:inline-block;padding:10px 18px;background:#201c26;color:#faf8f3;text-decoration:none;border-radius:5px'

function renderPart(part: MailPart): string {
  if ('text' in part) return `<p>${escapeHtml(part.text).replaceAll('\n', '<br>')}</p>`
  const url = escapeHtml(part.url)
  return `<p><a href="${url}" style="${BUTTON}">${escapeHtml(part.label)}</a></p>
<p style="font-size:13px;color:#5e5767">Or open this address:<br>${url}</p>`
}

/** The same mail as HTML. Styles stand at the elements: mail programs drop everything else. */
export const renderHtml = ({ subject, parts }: Mail): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escapeHtml(subject)}</title></head>
<body style="margin:0;background:#faf8f3;color:#201c26;font:16px/1.5 sans-serif">
<div style="max-width:34rem;margin:0 auto;padding:24px">
${parts.map(renderPart).join('\n')}
<p style="font-size:13px;color:#5e5767">${SIGNATURE}</p>
</div></body></html>
`
