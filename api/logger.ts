import pino from 'pino'
import type { DestinationStream, Logger } from 'pino'

/** Structured logs, one JSON object a line. Requests are logged by name of field; this is the net beneath. */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  const options = {
    level,
    base: null,
    timestamp: pino.stdTimeFunctions.isoTime,
    redact: {
      paths: [
        'password',
        '*.password',
        'req.headers.cookie',
        'req.headers.authorization',
        'res.headers["set-cookie"]',
      ],
      censor: '[redacted]',
    },
  }
  return destination === undefined ? pino(options) : pino(options, destination)
}
