import type { Tenant } from '../../db/tenant'
import type { Notice } from '../notifications/notifications.send'

/** One reminder that may be due for the organisation and side of a tenant; told unless it was before. */
export interface Reminder {
  /** Which reminder: with the subject and the day it names it once and for all. */
  kind: string
  subjectId: string
  day: string
  notice: Omit<Notice, 'organisationId' | 'side' | 'roles'> & Partial<Pick<Notice, 'roles'>>
}

/** Finds what one side of an organisation may have to be reminded of today. */
export type Finder = (tenant: Tenant) => Promise<Reminder[]>
