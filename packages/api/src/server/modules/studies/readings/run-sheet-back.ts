import { invalidInput } from '../../../errors'
import type { StudyDataRow, StudyRow } from '../studies.repository'
import type { Reading } from './cells'
import type { ReadReadings } from './take'

/** Refuses the run sheet of another study: its readings were taken of another gauge, or in another order. */
export function refuseOtherSheet(
  { code }: Pick<StudyRow, 'code'>,
  { runSheet }: Pick<ReadReadings, 'runSheet'>,
): void {
  if (runSheet === null || runSheet.code === code) return
  throw invalidInput([
    {
      path: 'body.file',
      row: 1,
      column: 'A',
      message: `This is the run sheet of study ${runSheet.code.slice(0, 60)}, and these are the readings of ${code}. Choose the run sheet of ${code}, or open ${runSheet.code.slice(0, 60)} to store these.`,
    },
  ])
}

/**
 * A run sheet names all readings of its study from the first on. Those kept before stand at its head; only what
 * follows them is new. Where they differ from what is kept, nobody can tell which hold.
 */
export function withoutKept(
  { readings, runSheet }: Pick<ReadReadings, 'readings' | 'runSheet'>,
  kept: Pick<StudyDataRow, 'values'> | undefined,
): Reading[] {
  if (runSheet === null || !kept) return readings
  const differs = kept.values.findIndex((value, at) => readings[at]?.value !== value)
  if (differs < 0) return readings.slice(kept.values.length)
  const at = readings[differs]
  throw invalidInput([
    {
      path: 'body.file',
      ...(at ? { row: at.row, column: at.column } : {}),
      message: `This run sheet does not begin with the ${kept.values.length} readings kept so far: reading ${differs + 1} is ${at ? at.text.slice(0, 40) : 'missing'}. Mend the sheet, or store it as all readings, which replaces those kept.`,
    },
  ])
}
