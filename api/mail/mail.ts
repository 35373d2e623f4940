/** A part of a mail: words, or the one thing to press. */
export type MailPart = { text: string } | { label: string; url: string }

/** What a mail says, once; the text and the HTML are both made from it. */
export interface Mail {
  to: string
  subject: string
  parts: readonly MailPart[]
}
