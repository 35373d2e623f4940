/** The pages that take a token. It stands after the #, which browsers send to nobody. */
const PAGES = {
  invitation: '/invitation',
  'first-group': '/first-group',
  'reset-password': '/reset-password',
  'confirm-email': '/confirm-email',
} as const

export type Links = (page: keyof typeof PAGES, token: string) => string

/** `origin` tells the address people reach the product by: never taken from a request, which could claim any. */
export const linksFrom =
  (origin: () => string): Links =>
  (page, token) =>
    `${origin()}${PAGES[page]}#${token}`
