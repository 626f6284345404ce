import type { Logger } from 'pino'
import type { Side } from '../../../contract/access'
import type { Database } from '../../db/database'
import { withTenant } from '../../db/tenant'
import type { Services } from '../../services'
import { workingRoles } from '../notifications/notifications.send'
import { remindOfAgreements } from './reminders.agreements'
import { remindOfCalibrations } from './reminders.calibrations'
import { claim, selectSides } from './reminders.repository'
import { remindOfRequests } from './reminders.requests'
import { remindOfReviews } from './reminders.reviews'
import { remindOfStandings } from './reminders.standings'
import type { Finder } from './reminders.types'

export interface ReminderDependencies {
  /** Under the system role, which reads as one organisation after the other and writes only what it told. */
  database: Database
  logger: Logger
  clock: () => Date
}

const finders: readonly Finder[] = [
  remindOfRequests,
  remindOfReviews,
  remindOfStandings,
  remindOfCalibrations,
  remindOfAgreements,
]

/** Nobody: no person is left out of what the chore tells. */
const nobody = '00000000-0000-0000-0000-000000000000'

/**
 * Tells every side what comes near or is over by today's calendar, each thing once: what was told is kept under a key
 * in the transaction that writes the messages, so that any number of workers may run this as often as they like, and
 * one that was down tells what is left to tell. What goes wrong for one organisation does not keep the others.
 *
 * @returns how many reminders were told
 */
export async function tellReminders(
  dependencies: ReminderDependencies,
  stopped: () => boolean = () => false,
): Promise<number> {
  let told = 0
  for (const party of await selectSides(dependencies.database)) {
    if (stopped()) break
    try {
      told += await remind(dependencies, party)
    } catch (error) {
      dependencies.logger.error({ err: error, ...party }, 'reminders not told')
    }
  }
  return told
}

async function remind(
  { database, clock, logger }: ReminderDependencies,
  { organisationId, side }: { organisationId: string; side: Side },
): Promise<number> {
  const context = { organisationId, side, userId: nobody, roles: [], authenticatedAt: '' }
  return withTenant(database, servicesOf(clock, logger), context, async (tenant) => {
    let told = 0
    for (const finder of finders)
      for (const { notice } of await claim(tenant, await finder(tenant))) {
        tenant.notify({ organisationId, side, roles: workingRoles[side], ...notice })
        told += 1
      }
    return told
  })
}

/** Reminders come from dates alone: a chore that asked for a file or an engine would be at fault. */
const servicesOf = (clock: () => Date, logger: Logger): Services => {
  const none = async (): Promise<never> => {
    throw new Error('A reminder needs neither files nor engines.')
  }
  return {
    clock,
    logger,
    files: { put: none, get: none, check: none },
    engines: {
      ...{ current: { version: '', sha256: '', file: '' }, releases: [] },
      ...{ evaluate: none, evaluateClause: none, recompute: none, source: none },
    },
  }
}
