import { z } from 'zod'
import { defineEndpoint } from './define'

export const health = defineEndpoint({
  method: 'get',
  path: '/health',
  access: 'public',
  response: z.object({ status: z.literal('ok') }),
  summary: 'Answers when the database and the file store answer.',
})

export const engineSource = defineEndpoint({
  method: 'get',
  path: '/engines/:sha256',
  access: 'signed-in',
  params: z.object({ sha256: z.string().regex(/^[0-9a-f]{64}\.mjs$/) }),
  summary: 'The computation as released under this hash, for recomputing in the browser.',
})

export const evaluate = defineEndpoint({
  method: 'post',
  path: '/evaluate',
  access: 'signed-in',
  body: z.record(z.string(), z.unknown()),
  response: z.record(z.string(), z.unknown()),
  summary: 'Computes one input of the computation contract.',
})
