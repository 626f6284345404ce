import type { studies } from '@evenrule/api/contract'
import { formatDate } from '../../format'
import { studyResultWords as words } from '../../strings/studies'
import { standardText } from '../gauges'
import { readAsText } from './entry'

/** One line of what is kept with the readings. */
export interface DataFact {
  label: string
  text: string
}

const namesText = (people: studies.StudyRevision['takenBy']): string =>
  people.map(({ name }) => name ?? words.erased).join(', ')

const calibrationText = (of: studies.Study['calibration']['gauge']): string =>
  of
    ? words.calibrationOf(formatDate(of.calibratedOn), formatDate(of.dueOn), of.certificateNumber)
    : words.calibrationNone

/** Where the readings of a study come from and what they were compared with; files and hashes stand beside it. */
export function dataFacts(study: studies.Study, data: studies.StudyRevision): DataFact[] {
  const { standard } = study
  const engine = study.evaluations[0]
  const facts: [string, string][] = [
    [words.takenBy, words.takenByText(namesText(data.takenBy), data.appraiser)],
    [words.source, `${words.sources[data.source]}, ${formatDate(data.createdAt)}`],
    [words.readAs, data.source === 'typed' ? '' : readAsText(data.readAs, data.source)],
    [words.leftOut, data.leftOut.map(({ row, text }) => words.leftOutRow(row, text)).join(', ')],
    [words.measuredAs, `${words.measuredAsWords[study.measuredAs]}, ${study.unit}`],
    [words.standard, `${standard.code} ${standard.name}, ${standardText(standard)}`],
    [words.gaugeCalibration, calibrationText(study.calibration.gauge)],
    [words.standardCalibration, calibrationText(study.calibration.standard)],
    [words.engine, engine ? words.engineText(engine.engineVersion, engine.engineSha256) : ''],
  ]
  return facts.flatMap(([label, text]) => (text ? [{ label, text }] : []))
}
