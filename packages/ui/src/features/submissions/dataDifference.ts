import type { Content, FrozenStudy } from './reading'

/** One reading on either side of a correction, numbered from one. */
export interface ReadingAt {
  number: number
  text: string
}
/** A reading that was changed, taken out or added. */
export interface ReadingChange {
  before: ReadingAt | null
  after: ReadingAt | null
}

/** What a correction changed in one study. */
export interface StudyDifference {
  code: string
  before: FrozenStudy | null
  after: FrozenStudy | null
  changes: ReadingChange[]
  /** Readings that stayed as they were. */
  kept: number
}

/**
 * The readings that differ, in order. What stayed is the longest run of equal texts in the same order; a reading
 * taken out beside one put in counts as changed.
 */
export function readingChanges(
  before: readonly string[],
  after: readonly string[],
): { changes: ReadingChange[]; kept: number } {
  const common = commonRuns(before, after)
  const changes: ReadingChange[] = []
  let [i, j, kept] = [0, 0, 0]
  const out: ReadingAt[] = []
  const added: ReadingAt[] = []
  const flush = () => {
    for (let at = 0; at < Math.max(out.length, added.length); at += 1)
      changes.push({ before: out[at] ?? null, after: added[at] ?? null })
    out.length = added.length = 0
  }
  while (i < before.length || j < after.length) {
    const [left, right] = [before[i], after[j]]
    if (left !== undefined && left === right) {
      flush()
      ;[i, j, kept] = [i + 1, j + 1, kept + 1]
    } else if (right === undefined || (left !== undefined && common(i + 1, j) >= common(i, j + 1))) {
      out.push({ number: i + 1, text: left ?? '' })
      i += 1
    } else {
      added.push({ number: j + 1, text: right })
      j += 1
    }
  }
  flush()
  return { changes, kept }
}

/** Length of the longest common sequence of the ends that begin at two places. */
function commonRuns(before: readonly string[], after: readonly string[]): (i: number, j: number) => number {
  const width = after.length + 1
  const lengths = new Uint16Array((before.length + 1) * width)
  for (let i = before.length - 1; i >= 0; i -= 1)
    for (let j = after.length - 1; j >= 0; j -= 1)
      lengths[i * width + j] =
        before[i] === after[j]
          ? lengths[(i + 1) * width + j + 1]! + 1
          : Math.max(lengths[(i + 1) * width + j]!, lengths[i * width + j + 1]!)
  return (i, j) => lengths[i * width + j] ?? 0
}

/** What one frozen text has otherwise than the one before it, study by study; unchanged studies are left out. */
export function dataDifference(before: Content, after: Content): StudyDifference[] {
  const codes = new Set([...before.studies, ...after.studies].map(({ code }) => code))
  return [...codes].flatMap((code) => {
    const [was, is] = [before, after].map(({ studies }) => studies.find((study) => study.code === code))
    if (was?.data.sha256 === is?.data.sha256 && was?.data.revision === is?.data.revision) return []
    const found = readingChanges(was?.data.readings ?? [], is?.data.readings ?? [])
    return [{ code, before: was ?? null, after: is ?? null, ...found }]
  })
}
