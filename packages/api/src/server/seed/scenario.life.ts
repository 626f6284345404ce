import type { GaugeEventKind } from '../../contract/standing'
import type { OrganisationKey } from './scenario.organisations'

interface DemoEvent {
  owner: OrganisationKey
  gauge: string
  daysAgo: number
  kind: GaugeEventKind
  words: string
  /** The customer's approver lets what it suspended stand again, so many days before the seeding. */
  reinstated?: { daysAgo: number; by: OrganisationKey; words: string }
}

/** What happened to gauges since their acceptances. */
export const gaugeEvents: readonly DemoEvent[] = [
  {
    owner: 'osmere',
    gauge: 'LT-2',
    daysAgo: 52,
    kind: 'changed',
    words: 'Evaluation program 4.2 in place of 4.0; the filter of the form measurement is new.',
    reinstated: {
      daysAgo: 47,
      by: 'brackwell',
      words: 'The master was measured under both programs, the difference is below 0.1 µm.',
    },
  },
  {
    owner: 'osmere',
    gauge: 'BG-7',
    daysAgo: 40,
    kind: 'moved',
    words: 'From the turning shop to the measuring room, same stand.',
  },
  {
    owner: 'velloy',
    gauge: 'HG-6',
    daysAgo: 30,
    kind: 'repaired',
    words: 'Anvil exchanged after a drop; the zero was set anew.',
  },
]

/** A calibration that found a gauge out of its limits: it suspends back to the last good one. */
export const foundOutside = {
  owner: 'velloy',
  gauge: 'FT-4',
  daysAgo: 21,
  intervalDays: 365,
  words: 'The transducer reads 1.8 % high over the upper third of its range.',
} as const

/** A calibration whose certificate is still to come. */
export const withoutCertificate = {
  owner: 'velloy',
  gauge: 'MM-2',
  daysAgo: 6,
  intervalDays: 365,
} as const

/**
 * A new revision of a part with one changed limit. The supplier sets its tasks up anew, and the customer carries over
 * what did not change, all but one.
 */
export const revised = {
  part: '9022-005',
  label: 'C',
  daysAgo: 8,
  /** The characteristic whose upper limit changes. */
  changed: 3,
  tightenTo: 0.6,
  carried: [1],
  carriedDaysAgo: 7,
} as const
