import { z } from 'zod'
import { instant, organisationParams, pageOf, pageQuery, paramsWith, sortBy, uuid } from './common'
import { defineEndpoint } from './define'

/** What a message is about, so that a person can choose which kinds come by mail too. */
export const messageKinds = [
  'agreement',
  'request',
  'submission',
  'challenge',
  'decision',
  'standing',
  'invitation',
  'reminder',
] as const
export type MessageKind = (typeof messageKinds)[number]
const messageKind = z.enum(messageKinds)

export const messageSchema = z.object({
  id: uuid,
  kind: messageKind,
  subject: z.string(),
  body: z.string(),
  /** Path of the page it is about, in the app of this side. */
  link: z.string(),
  createdAt: instant,
  readAt: instant.nullable(),
})
export type Message = z.output<typeof messageSchema>

export const listMessages = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/messages',
  access: 'messages.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['createdAt', 'subject', 'kind'], '-createdAt'),
    /** `unread` leaves out what was read. */
    show: z.enum(['all', 'unread']).default('all'),
    kind: messageKind.optional(),
  }),
  response: pageOf(messageSchema).extend({
    /** Unread messages of this side in all, whatever the filters. */
    unread: z.number().int(),
  }),
  summary: 'The messages to the person signed in, for this organisation on this side.',
})

export const readMessage = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/messages/:messageId',
  access: 'messages.read',
  params: paramsWith('messageId'),
  response: messageSchema,
  summary: 'One message to the person signed in; looking at it does not mark it.',
})

export const markMessageRead = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/messages/:messageId/read',
  access: 'messages.read',
  params: paramsWith('messageId'),
  response: messageSchema,
  summary: 'Marks a message as read; the first time counts.',
})

export const markAllMessagesRead = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/messages/read',
  access: 'messages.read',
  params: organisationParams,
  response: z.object({ marked: z.number().int() }),
  summary: 'Marks every message of this side as read.',
})

const mailChoice = z.object({
  /** Kinds that do not come by mail; they stay readable in the app. */
  muted: z
    .array(messageKind)
    .max(messageKinds.length)
    .transform((kinds) => messageKinds.filter((kind) => kinds.includes(kind))),
})

export const readMailChoice = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/mail-choice',
  access: 'messages.read',
  params: organisationParams,
  response: mailChoice.extend({ email: z.string() }),
  summary: 'Where mail of the person signed in goes, and which kinds do not.',
})

export const changeMailChoice = defineEndpoint({
  method: 'put',
  path: '/organisations/:organisationId/mail-choice',
  access: 'messages.read',
  params: organisationParams,
  body: mailChoice,
  response: mailChoice.extend({ email: z.string() }),
  summary: 'Chooses which kinds of message come by mail; it holds in every organisation of the person.',
})
