import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { selectTimeZone } from './organisations.repository'

/** Whether a membership has ended by a day: its last day is over. */
export const hasEnded = (endsOn: string | null, today: string): boolean => endsOn !== null && endsOn < today

/** Today as this organisation's calendar has it: its own due days, calibrations and memberships are judged by it. */
export const todayOf = async (tenant: Tenant): Promise<string> =>
  dayIn(await selectTimeZone(tenant), tenant.now)
