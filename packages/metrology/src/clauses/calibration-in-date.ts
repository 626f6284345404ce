import type { CalibrationFacts, CalibrationWindow, ClauseDescriptor, Judgement, ReasonCode } from '../types'

interface Item {
  window: CalibrationWindow | null
  unknown: ReasonCode
  out: ReasonCode
}

/**
 * Gauge and reference standard in calibration on the day of collection: calibrated on or before it, due on or after
 * it. Days are ISO 8601 text, which sorts as days do.
 */
export const calibrationInDate: ClauseDescriptor<'calibration-in-date'> = {
  type: 'calibration-in-date',
  subject: 'calibration',
  measure: 'date',
  basis: 'document',
  studyKind: null,
  fields: [
    { name: 'gauge', kind: 'boolean', required: true, default: true },
    { name: 'standard', kind: 'boolean', required: true, default: true },
  ],
  check: () => [],
  judge: ({ parameters }, { calibration }): Judgement => {
    if (!calibration) return { ...undecided, reason: { code: 'calibration-unknown' } }
    const items = asked(parameters, calibration)
    const day = calibration.collectedOn
    const shown = { figure: day, interval: null, limits: sharedWindow(items), quantity: 'date' } as const
    // What is out of calibration is known to fall short, whatever else is missing.
    for (const { window, out } of items) {
      if (window && (day < window.calibratedOn || day > window.dueOn)) {
        return { ...shown, verdict: 'falls-short', reason: { code: out, ...window, collectedOn: day } }
      }
    }
    const missing = items.find(({ window }) => !window)
    return missing
      ? { ...shown, verdict: 'not-shown', reason: { code: missing.unknown, collectedOn: day } }
      : { ...shown, verdict: 'meets', reason: { code: 'in-calibration', collectedOn: day } }
  },
}

const undecided: Omit<Judgement, 'reason'> = {
  verdict: 'not-shown',
  figure: null,
  interval: null,
  limits: null,
  quantity: 'date',
}

function asked(which: { gauge: boolean; standard: boolean }, { gauge, standard }: CalibrationFacts): Item[] {
  const ofGauge: Item = {
    window: gauge,
    unknown: 'gauge-calibration-unknown',
    out: 'gauge-out-of-calibration',
  }
  const ofStandard: Item = {
    window: standard,
    unknown: 'standard-calibration-unknown',
    out: 'standard-out-of-calibration',
  }
  return [...(which.gauge ? [ofGauge] : []), ...(which.standard ? [ofStandard] : [])]
}

/** The days on which everything asked for was in calibration, as far as known. */
function sharedWindow(items: readonly Item[]): Judgement['limits'] {
  const windows = items.flatMap(({ window }) => (window ? [window] : []))
  if (windows.length === 0) return null
  const from = windows.map(({ calibratedOn }) => calibratedOn).sort()
  const until = windows.map(({ dueOn }) => dueOn).sort()
  return { lower: from[from.length - 1] ?? null, upper: until[0] ?? null }
}
