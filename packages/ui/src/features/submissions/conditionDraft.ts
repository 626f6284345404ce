import type { ConditionAsked, FollowUp } from '@evenrule/api/contract/conditions'
import { conditionWords as words } from '../../strings/conditions'

/** A condition as it is being written. */
export interface ConditionDraft extends Omit<ConditionAsked, 'followUp'> {
  followUp: FollowUp | ''
}

export const emptyCondition = (): ConditionDraft => ({ text: '', dueOn: '', owner: 'supplier', followUp: '' })

/** What is missing of each condition, by the path of its field. */
export function missingInConditions(
  conditions: readonly ConditionDraft[],
  today: string,
): Record<string, string | undefined> {
  const found = conditions.flatMap(({ text, dueOn, followUp }, at): [string, string | undefined][] => [
    [`conditions.${at}.text`, text.trim() ? undefined : words.sayWhat],
    [`conditions.${at}.dueOn`, !dueOn ? words.sayWhen : dueOn < today ? words.dueInPast : undefined],
    [`conditions.${at}.followUp`, followUp ? undefined : words.chooseFollowUp],
  ])
  return Object.fromEntries(found)
}

/** The conditions as the contract takes them; only where nothing is missing. */
export const askedConditions = (conditions: readonly ConditionDraft[]): ConditionAsked[] =>
  conditions.map(({ followUp, ...rest }) => ({ ...rest, followUp: followUp || 'other' }))
