import { contentOf, type FrozenStudy } from './submission-content'

/** One reading on either side of a correction, numbered from one as people count. */
export interface ReadingAt {
  number: number
  text: string
}

/** A reading that was changed (both), removed (`after` null) or added (`before` null). */
export interface ReadingChange {
  before: ReadingAt | null
  after: ReadingAt | null
}

/** A row that held no number where a reading was expected. */
export type LeftOutRow = FrozenStudy['data']['leftOut'][number]

/** A value that was frozen otherwise than before; null on the side that has none. */
export interface FieldChange {
  /** Where it stands, such as `standard.certifiedValue`, `calibration.gauge.dueOn`, `appraiser` or `collectedOn`. */
  field: string
  before: string | null
  after: string | null
}

/** What differs in one study; null on the side that does not have the study. */
export interface StudyDifference {
  code: string
  before: FrozenStudy | null
  after: FrozenStudy | null
  /** Why its readings were replaced, as the supplier said. */
  reason: string | null
  readings: ReadingChange[]
  /** Readings that stayed as they were. */
  kept: number
  /** Rows that are left out now and were not before, and the other way round. */
  leftOut: LeftOutRow[]
  takenIn: LeftOutRow[]
  /** Reference standard, calibrations, appraiser, day. */
  fields: FieldChange[]
}

/** Most pairs of readings that are compared with each other; beyond it they are told by place. */
const mostPairs = 4_000_000

/** What two signed texts of a submission have otherwise, study by study; studies that are the same are left out. */
export function dataDifference(textA: string, textB: string): StudyDifference[] {
  const [before, after] = [textA, textB].map((text) => contentOf(text)?.studies ?? [])
  if (!before || !after) return []
  const codes = new Set([...before, ...after].map(({ code }) => code))
  return [...codes].flatMap((code) => {
    const was = before.find((study) => study.code === code) ?? null
    const is = after.find((study) => study.code === code) ?? null
    const found = differenceOf(code, was, is)
    const differs =
      found.readings.length + found.leftOut.length + found.takenIn.length + found.fields.length > 0
    return differs || !was || !is ? [found] : []
  })
}

function differenceOf(code: string, before: FrozenStudy | null, after: FrozenStudy | null): StudyDifference {
  const [was, is] = [before?.data.leftOut ?? [], after?.data.leftOut ?? []]
  const { changes, kept } = readingChanges(before?.data.readings ?? [], after?.data.readings ?? [])
  return {
    ...{ code, before, after, kept, readings: changes },
    reason: after?.data.reason ?? null,
    leftOut: is.filter((row) => !was.some((each) => sameRow(each, row))),
    takenIn: was.filter((row) => !is.some((each) => sameRow(each, row))),
    fields: fieldChanges(before, after),
  }
}

const sameRow = (a: LeftOutRow, b: LeftOutRow): boolean =>
  a.row === b.row && a.column === b.column && a.text === b.text

/** Everything beside the readings that a correction can change, by the path under which it is frozen. */
const fieldsOf = (study: FrozenStudy | null): Record<string, string | null> => {
  const { gauge = null, standard: ring = null } = study?.calibration ?? {}
  return {
    'standard.code': study?.standard.code ?? null,
    'standard.name': study?.standard.name ?? null,
    'standard.certifiedValue': study && `${study.standard.certifiedValue} ${study.standard.unit}`,
    'standard.expandedUncertainty': study?.standard.expandedUncertainty ?? null,
    'standard.coverageFactor': study?.standard.coverageFactor ?? null,
    'calibration.gauge.certificateNumber': gauge?.certificateNumber ?? null,
    'calibration.gauge.dueOn': gauge?.dueOn ?? null,
    'calibration.standard.certificateNumber': ring?.certificateNumber ?? null,
    'calibration.standard.dueOn': ring?.dueOn ?? null,
    appraiser: study?.data.appraiser ?? null,
    collectedOn: study?.data.collectedOn ?? null,
  }
}

function fieldChanges(before: FrozenStudy | null, after: FrozenStudy | null): FieldChange[] {
  const [was, is] = [fieldsOf(before), fieldsOf(after)]
  return Object.keys(was)
    .map((field) => ({ field, before: was[field] ?? null, after: is[field] ?? null }))
    .filter((each) => each.before !== each.after)
}

/**
 * The readings that differ, in order. What stayed is the longest run of equal texts in the same order; a reading
 * taken out beside one put in counts as changed.
 */
export function readingChanges(
  before: readonly string[],
  after: readonly string[],
): { changes: ReadingChange[]; kept: number } {
  const head = commonHead(before, after)
  const tail = commonTail(before.slice(head), after.slice(head))
  const left = before.slice(head, before.length - tail)
  const right = after.slice(head, after.length - tail)
  const pairs = left.length * right.length > mostPairs ? byPlace(left, right) : inCommon(left, right)
  return { changes: changesBetween(left, right, pairs, head), kept: head + tail + pairs.length }
}

const commonHead = (a: readonly string[], b: readonly string[]): number => {
  const end = a.findIndex((text, at) => text !== b[at])
  return end < 0 ? a.length : end
}
const commonTail = (a: readonly string[], b: readonly string[]): number =>
  Math.min(commonHead(a.toReversed(), b.toReversed()), a.length, b.length)

/** Places, on both sides, of readings that stayed. */
type Pair = readonly [number, number]

const byPlace = (left: readonly string[], right: readonly string[]): Pair[] =>
  left.flatMap((text, at): Pair[] => (text === right[at] ? [[at, at]] : []))

/** The longest run of equal texts in the same order. */
function inCommon(left: readonly string[], right: readonly string[]): Pair[] {
  const width = right.length + 1
  const lengths = new Uint32Array((left.length + 1) * width)
  const length = (i: number, j: number) => lengths[i * width + j] ?? 0
  for (let i = left.length - 1; i >= 0; i -= 1)
    for (let j = right.length - 1; j >= 0; j -= 1)
      lengths[i * width + j] =
        left[i] === right[j] ? length(i + 1, j + 1) + 1 : Math.max(length(i + 1, j), length(i, j + 1))
  const pairs: Pair[] = []
  for (let [i, j] = [0, 0]; i < left.length && j < right.length;) {
    if (left[i] === right[j]) pairs.push([i++, j++])
    else if (length(i + 1, j) >= length(i, j + 1)) i += 1
    else j += 1
  }
  return pairs
}

/** Between two readings that stayed, those taken out stand beside those put in. */
function changesBetween(
  left: readonly string[],
  right: readonly string[],
  pairs: readonly Pair[],
  head: number,
): ReadingChange[] {
  const changes: ReadingChange[] = []
  let [i, j] = [0, 0]
  for (const [untilI, untilJ] of [...pairs, [left.length, right.length] as const]) {
    for (let at = 0; at < Math.max(untilI - i, untilJ - j); at += 1)
      changes.push({
        before: i + at < untilI ? { number: head + i + at + 1, text: left[i + at] ?? '' } : null,
        after: j + at < untilJ ? { number: head + j + at + 1, text: right[j + at] ?? '' } : null,
      })
    ;[i, j] = [untilI + 1, untilJ + 1]
  }
  return changes
}
