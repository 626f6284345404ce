import type { AnswerInputOf, BodyOf, QueryOf } from '../../../contract/define'
import {
  messageKinds,
  type changeMailChoice,
  type listMessages,
  type readMailChoice,
  type readMessage,
} from '../../../contract/messages'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import {
  countUnread,
  selectMailChoice,
  selectMessage,
  selectMessages,
  setMailChoice,
  setRead,
} from './messages.repository'

/** One page of the person's messages for this organisation on this side. */
export async function listOfMessages(tenant: Tenant, query: QueryOf<typeof listMessages>) {
  const page = await paged(
    query,
    (asked) => selectMessages(tenant, asked),
    (rows) => rows.map(({ message }) => message),
  )
  return { ...page, unread: await countUnread(tenant) }
}

/** One message of the person's own; 404 for those of others. */
export async function messageOf(
  tenant: Tenant,
  messageId: string,
): Promise<AnswerInputOf<typeof readMessage>> {
  const row = await selectMessage(tenant, messageId)
  if (!row) throw notFound('message')
  return row
}

export async function markRead(tenant: Tenant, messageId: string) {
  await setRead(tenant, messageId)
  return messageOf(tenant, messageId)
}

export const markAllRead = async (tenant: Tenant) => ({ marked: await setRead(tenant) })

/** Which kinds of message the person keeps out of their mail. */
export async function mailChoiceOf(tenant: Tenant): Promise<AnswerInputOf<typeof readMailChoice>> {
  const { email, muted } = await selectMailChoice(tenant)
  return { email, muted: messageKinds.filter((kind) => muted.includes(kind)) }
}

export async function chooseMail(tenant: Tenant, { muted }: BodyOf<typeof changeMailChoice>) {
  await setMailChoice(tenant, muted)
  return mailChoiceOf(tenant)
}
