import { formatChance, type Unit } from '../../format'
import { comparisonWords as words } from '../../strings/agreements'
import { biasText, ruleNames } from '../../strings/consequences'
import type { ClauseEffect, clauseEffects } from './consequenceRows'
import type { ClauseDifference } from '../agreements/differences'

const wrongOf = (effect: ClauseEffect | null, unit: Unit): string | undefined => {
  const worse = effect?.computed.incentives.worseRepeatabilityHelps
    ? effect.incentives.find(({ kind }) => kind === 'worse-repeatability')
    : undefined
  const shown = effect?.computed.incentives.shown.find(({ change }) => change === 'worse-repeatability')
  return effect && worse && shown
    ? words.effects.worse(
        ruleNames[effect.clause.type],
        formatChance(shown.before),
        formatChance(shown.after),
        biasText(worse.bias, unit),
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
