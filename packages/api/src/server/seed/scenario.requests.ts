import type { RequestOccasion } from '../../contract/requests'
import type { OrganisationKey } from './scenario.organisations'

/** A request of the demonstration: by whom and of whom, when, until when, of which tasks, and what became of it. */
export interface DemoRequest {
  customer: OrganisationKey
  supplier: OrganisationKey
  askedDaysAgo: number
  /** Days before the seeding on which it is due; negative for a day to come. */
  dueDaysAgo: number
  occasion: RequestOccasion
  words: string
  /** Part number, number on the drawing, gauge. */
  tasks: readonly (readonly [string, number, string])[]
  /** The day was moved to that one, so many days before the seeding. */
  moved?: { daysAgo: number; dueDaysAgo: number; reason: string }
  withdrawn?: { daysAgo: number; reason: string }
}

/** In every state, in several relationships: answered and closed ones by the submissions played meanwhile. */
export const requests: readonly DemoRequest[] = [
  {
    ...{ customer: 'brackwell', supplier: 'tarnfield', askedDaysAgo: 300, dueDaysAgo: 240 },
    ...{ occasion: 'new-part', words: 'First delivery of the new output shaft.' },
    tasks: [
      ['7741-220', 1, 'BG-14'],
      ['7741-220', 1, 'BG-11'],
      ['7741-220', 2, 'AG-02'],
    ],
  },
  {
    ...{ customer: 'brackwell', supplier: 'tarnfield', askedDaysAgo: 60, dueDaysAgo: 20 },
    ...{ occasion: 'change', words: 'The width was to be measured on the new line.' },
    tasks: [['7741-231', 2, 'MM-07']],
    withdrawn: { daysAgo: 52, reason: 'The width stays on the old line after all.' },
  },
  {
    ...{ customer: 'brackwell', supplier: 'tarnfield', askedDaysAgo: 30, dueDaysAgo: -6 },
    ...{ occasion: 'yearly', words: 'Please renew what is older than half a year.' },
    tasks: [
      ['7741-220', 3, 'VC-22'],
      ['7741-231', 3, 'SR-2'],
      ['7750-018', 3, 'VC-22'],
    ],
  },
  {
    ...{ customer: 'brackwell', supplier: 'tarnfield', askedDaysAgo: 24, dueDaysAgo: 11 },
    occasion: 'complaint',
    words: 'Two shafts of the last delivery did not fit. Show that the coordinates are measured rightly.',
    tasks: [['7750-018', 2, 'CM-1']],
    moved: { daysAgo: 12, dueDaysAgo: 4, reason: 'You needed the machine for another customer until then.' },
  },
  {
    ...{ customer: 'brackwell', supplier: 'tarnfield', askedDaysAgo: 12, dueDaysAgo: -12 },
    ...{ occasion: 'yearly', words: '' },
    tasks: [['7741-220', 1, 'BG-14']],
  },
  {
    ...{ customer: 'norvane', supplier: 'tarnfield', askedDaysAgo: 250, dueDaysAgo: 210 },
    ...{ occasion: 'new-part', words: 'For the release of the part.' },
    tasks: [['NV-55-310', 3, 'VC-22']],
  },
  {
    ...{ customer: 'norvane', supplier: 'tarnfield', askedDaysAgo: 100, dueDaysAgo: 70 },
    ...{ occasion: 'other', words: '' },
    tasks: [['NV-55-322', 2, 'BA-3']],
    withdrawn: { daysAgo: 96, reason: 'Asked for twice by mistake.' },
  },
  {
    ...{ customer: 'norvane', supplier: 'tarnfield', askedDaysAgo: 31, dueDaysAgo: -3 },
    ...{ occasion: 'change', words: 'New supplier of the blanks.' },
    tasks: [['NV-55-310', 1, 'AG-02']],
  },
  {
    ...{ customer: 'norvane', supplier: 'tarnfield', askedDaysAgo: 15, dueDaysAgo: 2 },
    ...{ occasion: 'yearly', words: 'Our yearly review is at the end of the month.' },
    tasks: [
      ['NV-55-310', 2, 'CM-1'],
      ['NV-55-322', 1, 'BG-14'],
    ],
  },
  {
    ...{ customer: 'brackwell', supplier: 'osmere', askedDaysAgo: 5, dueDaysAgo: -23 },
    ...{ occasion: 'change', words: 'After the move to machining line 2.' },
    tasks: [
      ['3310-417', 1, 'VC-3'],
      ['3310-402', 3, 'CM-3'],
    ],
  },
]
