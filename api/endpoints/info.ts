import { publicInfo } from '#core/wire/index'
import { z } from 'zod'
import { endpoint } from './endpoint.ts'

const health = z.object({ status: z.literal('ok') }).meta({ id: 'Health' })

export const healthEndpoint = endpoint({
  id: 'health',
  method: 'get',
  path: '/health',
  tag: 'server',
  summary: 'Whether the server and its database answer',
  may: 'anyone',
  status: 200,
  answer: health,
  answerIs: 'Both answer',
  problems: ['database-away'],
})

export const infoEndpoint = endpoint({
  id: 'info',
  method: 'get',
  path: '/info',
  tag: 'server',
  summary: 'What the sign-in page needs: the core’s version and, in demo mode, the demo sign-ins',
  may: 'anyone',
  status: 200,
  answer: publicInfo,
  answerIs: 'Version and mode',
})
