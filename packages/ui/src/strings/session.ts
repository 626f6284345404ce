import type { SignInProblem } from '@evenrule/api/contract/sign-in'
import type { ThemeChoice } from '../theme/useTheme'
import type { Side } from '../theme/tokens'

/** Words around signing in, the account and the organisation one works for. */

const apps: Record<Side, string> = { supplier: 'supplier app', customer: 'customer app' }

export const appNames: Record<Side, string> = { supplier: 'Supplier app', customer: 'Customer app' }

export const signInWords = {
  question: 'Who is signing in?',
  /** What this app is for, so that nobody signs in at the wrong side of the table. */
  answer: {
    supplier:
      'This is the supplier app: plan studies, upload readings and put the proof before your customers.',
    customer: 'This is the customer app: review what suppliers submit, recompute it and decide.',
  } satisfies Record<Side, string>,
  action: 'Sign in',
  next: 'Your organisation’s sign-in page opens; afterwards you are back here.',
  other: {
    supplier: 'Do you buy the parts? Use the customer app of your organisation.',
    customer: 'Do you make the parts? Use the supplier app of your organisation.',
  } satisfies Record<Side, string>,
} as const

/** Why a sign-in did not come about, and what to do. */
export const signInProblemWords: Record<SignInProblem, string> = {
  'not-begun-here':
    'This sign-in was not begun in this window, or it was used already. Sign in again from here; it takes one step.',
  'took-too-long': 'The sign-in was left open too long. Sign in again.',
  left: 'The sign-in was left before it was finished. Nothing has changed; sign in when you are ready.',
  'provider-refused':
    'Your organisation’s sign-in did not let this through. Try again; if it stays so, ask the person who manages your sign-ins.',
  'provider-unreachable':
    'The sign-in page cannot be reached right now. Wait a moment and try again; your work is kept.',
  'no-email':
    'Your sign-in does not tell us an e-mail address, which messages need. Ask the person who manages your sign-ins to release it.',
  'another-person':
    'Somebody else signed in than the one who began. A signature must come from the person who is signed in: sign in as yourself, or sign out first.',
  'not-afresh':
    'A signature needs a sign-in that happened just now, and the provider used an older one. Sign in again and enter your credentials.',
}

/** What a signature asks for whose sign-in is not of the last minutes. */
export const afreshWords = { act: 'Sign in afresh' } as const

export const signedOutWords = {
  question: 'Are you signed out?',
  answer: 'Yes. Nobody can go on in your name in this browser window.',
  again: 'Sign in again',
} as const

export const endedWords = {
  text: 'Your sign-in has ended. What you typed is still here.',
  action: 'Sign in and come back to this page',
} as const

export const accountWords = {
  menu: 'Account',
  organisation: 'Organisation',
  openOther: (side: Side) => `Open the ${apps[side]}`,
  look: 'Look',
  signOut: 'Sign out',
  signOutEverywhere: 'Sign out everywhere',
  everywhereHint: 'Ends every sign-in of yours: both apps, every device.',
  noRole: 'No role',
} as const

export const themeWords: Record<ThemeChoice, string> = {
  system: 'As the system',
  light: 'Light',
  dark: 'Dark',
}

export const notFoundWords = {
  question: 'Is this the page you wanted?',
  answer:
    'There is no such page, or your organisation may not see it. Check the address, or start from the front page.',
  home: 'Go to the front page',
} as const

export const failureWords = {
  question: 'What went wrong?',
  again: 'Try again',
  page: 'A part of this page failed. What you typed is kept; load the page again if it stays incomplete.',
  outdated: 'The app has been renewed since this window was opened. Load the page again to go on.',
  reload: 'Load the page again',
  dismiss: 'Hide this',
} as const
