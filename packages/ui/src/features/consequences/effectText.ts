import { formatChance, type Unit } from '../../format'
import { comparisonWords as words } from '../../strings/agreements'
import { biasText, consequenceWords, ruleNames } from '../../strings/consequences'
import type { ClauseEffect, clauseEffects } from './consequenceRows'
import type { ClauseDifference } from '../agreements/differences'

const wrongOf = (effect: ClauseEffect | null, unit: Unit): string | undefined => {
  const worse = effect?.incentives.find(({ kind, wrong }) => wrong && kind === 'worse-repeatability')
  if (effect && worse)
    return words.effects.worse(
      ruleNames[effect.clause.type],
      formatChance(worse.before),
      formatChance(worse.after),
      biasText(worse.bias, unit),
    )
  const more = effect?.incentives.find(({ kind, wrong }) => wrong && kind === 'more-readings')
  return effect && more
    ? consequenceWords.moreReadingsHurt(
        ruleNames[effect.clause.type],
        formatChance(more.before),
        formatChance(more.after),
      )
    : undefined
}

/** What a row of the comparison does, in one sentence from what was computed; empty where there is nothing to say. */
export function effectText(
  row: ClauseDifference,
  effects: ReturnType<typeof clauseEffects> | undefined,
  unit: Unit,
): { text: string; wrong: boolean } {
  if (!row.after) return { text: '', wrong: false }
  if (effects?.before ?? effects?.after) {
    const wrong = wrongOf(effects?.after ?? null, unit)
    if (wrong) return { text: wrong, wrong: true }
    const replaced = row.change !== 'same' ? wrongOf(effects?.before ?? null, unit) : undefined
    return { text: replaced ?? words.effects.sound, wrong: false }
  }
  if (row.before?.type === 'design-minimum' && row.after.type === 'design-minimum') {
    const [before, after] = [row.before.parameters.readings, row.after.parameters.readings]
    if (before !== after) return { text: words.effects.readings(before, after), wrong: false }
  }
  return { text: '', wrong: false }
}
