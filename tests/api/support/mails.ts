import type { Mail } from '#api/mail/mail'
import { ORIGIN } from './harness.ts'

/** The token of the link a mail has to be pressed, which leads to `page`. */
export function tokenIn(mail: Mail | undefined, page: string): string {
  const part = mail?.parts.find((each) => 'url' in each)
  const [address, token] = (part && 'url' in part ? part.url : '').split('#')
  if (address !== `${ORIGIN}${page}` || token === undefined)
    throw new Error(`no link to ${page} in ${JSON.stringify(mail)}`)
  return token
}
