import type { IncomingMessage, ServerResponse } from 'node:http'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import type { HttpLogger } from 'pino-http'

const pathOf = (url: string | undefined): string => (url ?? '').split('?', 1)[0] ?? ''

/** One line a request: id, method, path, status, time. No header, no query, no body: none of them can leak a secret. */
export const requestLog = (logger: Logger): HttpLogger =>
  pinoHttp({
    logger,
    genReqId: (_req: IncomingMessage, res: ServerResponse) => String(res.getHeader('x-request-id')),
    serializers: {
      req: (req: { id: string; method: string; url: string }) => ({
        id: req.id,
        method: req.method,
        path: pathOf(req.url),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
    },
  })
