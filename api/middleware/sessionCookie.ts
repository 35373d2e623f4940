import type { CookieOptions, Request, Response } from 'express'

/** The cookie that carries the session's token. */
export interface SessionCookie {
  read(req: Request): string | null
  set(res: Response, token: string, expires: Date): void
  clear(res: Response): void
}

/** On https the name takes the __Host- prefix, with which browsers accept it from this host alone. */
export function sessionCookie(https: boolean): SessionCookie {
  const name = https ? '__Host-emberline_session' : 'emberline_session'
  const options: CookieOptions = { httpOnly: true, sameSite: 'lax', secure: https, path: '/' }
  return {
    read(req) {
      const cookies = req.cookies as Record<string, unknown>
      const value = cookies[name]
      return typeof value === 'string' ? value : null
    },
    set: (res, token, expires) => void res.cookie(name, token, { ...options, expires }),
    clear: (res) => void res.clearCookie(name, options),
  }
}
