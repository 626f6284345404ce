import { roles, type Role } from '@evenrule/api/contract'
import { memberWords } from '../../strings/members'

/** A yes or no for each role, as a form holds them. */
export const asChoices = (held: readonly Role[]): Record<Role, boolean> =>
  Object.fromEntries(roles.map((role) => [role, held.includes(role)])) as Record<Role, boolean>

export const chosenRoles = (choices: Record<Role, boolean>): Role[] => roles.filter((role) => choices[role])

/** What is wrong with a choice of no role at all. */
export const rolesError = (choices: Record<Role, boolean>): { roles: string } | undefined =>
  chosenRoles(choices).length > 0 ? undefined : { roles: memberWords.rolesMissing }
