import * as contract from '../../../contract/messages'
import { tenantRoute, type Route } from '../../http/route'
import {
  chooseMail,
  listOfMessages,
  mailChoiceOf,
  markAllRead,
  markRead,
  messageOf,
} from './messages.service'

export const messagesRoutes: Route[] = [
  tenantRoute(contract.listMessages, ({ tenant, query }) => listOfMessages(tenant, query)),
  tenantRoute(contract.markAllMessagesRead, ({ tenant }) => markAllRead(tenant)),
  tenantRoute(contract.readMessage, ({ tenant, params }) => messageOf(tenant, params.messageId)),
  tenantRoute(contract.markMessageRead, ({ tenant, params }) => markRead(tenant, params.messageId)),
  tenantRoute(contract.readMailChoice, ({ tenant }) => mailChoiceOf(tenant)),
  tenantRoute(contract.changeMailChoice, ({ tenant, body }) => chooseMail(tenant, body)),
]
