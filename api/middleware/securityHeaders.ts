import type { RequestHandler } from 'express'
import helmet from 'helmet'

/**
 * Headers that keep the page to itself. Styles may stand inline because the toast and dialog libraries write
 * <style> elements; scripts may not. HSTS and upgrading only where the public address is https: on plain http
 * they would lock people out.
 */
export function securityHeaders(https: boolean): RequestHandler {
  const self = ["'self'"]
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'none'"],
        scriptSrc: self,
        workerSrc: self,
        connectSrc: self,
        styleSrc: ["'self'", "'unsafe-inline'"],
        fontSrc: ["'self'", 'data:'],
        imgSrc: ["'self'", 'data:', 'blob:'],
        manifestSrc: self,
        formAction: self,
        baseUri: ["'none'"],
        frameAncestors: ["'none'"],
        ...(https ? { upgradeInsecureRequests: [] } : {}),
      },
    },
    strictTransportSecurity: https ? { maxAge: 31_536_000, includeSubDomains: false } : false,
    referrerPolicy: { policy: 'same-origin' },
    xFrameOptions: { action: 'deny' },
  })
}
