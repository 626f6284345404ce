import type { studies } from '@evenrule/api/contract'
import { describe, expect, it } from 'vitest'
import { planReasonText } from '../../strings/studies'
import { entryInput, entryProblems, entryStart, readAsText, shownInput } from './entry'
import { chanceOf, planAnswer, slotsOf, suggestedCode } from './planFacts'
import { verdictOf } from './studyText'
import { emptyGrid, pastedCells, spreadPaste, typedText } from './typedGrid'
import { unjudgedStudy, unjudgedText } from './unjudged'
import { planBody } from './usePlan'

/** Thin spaces made plain, so that expectations can be read. */
const seen = (text: string) => text.replaceAll('\u202F', ' ')

describe('the grid for typing readings', () => {
  it('takes a pasted column down from the cell it was pasted at', () =>
    expect(spreadPaste(['1', '', '', ''], 1, '24,001\r\n24,002\r\n')).toEqual(['1', '24,001', '24,002', '']))
  it('takes a pasted row as well, and grows where it needs room', () =>
    expect(spreadPaste(['', ''], 1, '2\t3\t4')).toEqual(['', '2', '3', '4']))
  it('keeps an empty cell in the middle and drops those at the end', () => {
    expect(pastedCells('1\n\n3\n\n')).toEqual(['1', '', '3'])
    expect(typedText(['1', '', '3', ' ', ''])).toBe('1\n\n3')
  })
  it('has a cell for every planned reading not kept yet, within reason', () => {
    expect(emptyGrid(25, 10)).toHaveLength(15)
    expect(emptyGrid(25, 25)).toHaveLength(1)
    expect(emptyGrid(100_000, 0)).toHaveLength(200)
  })
})

const start = entryStart({ planned: 3, kept: 0, texts: [], today: '2026-12-01', me: 'me', appraiser: 'A' })
const preview = (errorCount: number, mayLeaveOut: boolean) =>
  ({ errorCount, mayLeaveOut }) as studies.ReadingsPreview

describe('the entry of readings', () => {
  it('sends typed readings one a line, without choices that belong to files', () =>
    expect(entryInput({ ...start, typed: ['1,5', '2,5', ''], columns: ['B'] }, false)).toEqual({
      source: 'typed',
      text: '1,5\n2,5',
    }))
  it('sends the choices only where one was made', () => {
    expect(entryInput({ ...start, source: 'uploaded' }, true)).toEqual({ source: 'uploaded' })
    expect(
      entryInput({ ...start, source: 'pasted', pasted: 'a;1,5', columns: ['B'], decimal: 'comma' }, false),
    ).toEqual({ source: 'pasted', text: 'a;1,5', columns: ['B'], decimal: 'comma' })
  })
  it('stores what was shown, however it came to be read so', () => {
    const readAs = {
      ...{ kind: 'xlsx', sheet: 'Data', encoding: null, byteOrderMark: false, separator: null },
      ...{ decimal: 'point', layout: 'wide', headerRows: 1, columns: ['B', 'C'], columnNames: ['1', '2'] },
    }
    const shown = { readAs } as studies.ReadingsPreview
    expect(shownInput({ source: 'uploaded', columns: ['B'] }, shown)).toEqual({
      ...{ source: 'uploaded', sheet: 'Data', decimal: 'point' },
      ...{ layout: 'wide', headerRows: 1, columns: ['B', 'C'] },
    })
    expect(shownInput({ source: 'uploaded', columns: ['B'] }, null)).toEqual({
      source: 'uploaded',
      columns: ['B'],
    })
    expect(shownInput({ source: 'typed', text: '1' }, shown)).toEqual({ source: 'typed', text: '1' })
  })
  it('has nothing to send before anything is entered', () => {
    expect(entryInput(start, false)).toBeNull()
    expect(entryInput({ ...start, source: 'pasted', pasted: ' \n' }, false)).toBeNull()
    expect(entryInput({ ...start, source: 'uploaded', file: 'a.csv' }, false)).toBeNull()
  })
  it('asks for the file again after a reload', () =>
    expect(
      entryProblems(
        { ...start, source: 'uploaded', file: 'a.csv' },
        { hasInput: false, preview: null, correcting: false },
      ).source,
    ).toBe('Choose a.csv again: a file cannot be kept across a reload.'))
  it('is not stored while cells are wrong, unless their rows are left out', () => {
    const check = (errors: number, may: boolean, leaveOutBadRows: boolean) =>
      entryProblems(
        { ...start, leaveOutBadRows },
        { hasInput: true, preview: preview(errors, may), correcting: false },
      ).source
    expect(check(0, false, false)).toBeUndefined()
    expect(check(2, true, false)).toMatch(/^Mend the cells/)
    expect(check(2, true, true)).toBeUndefined()
    expect(check(2, false, true)).toMatch(/^Mend the cells/)
  })
  it('names who, when and, for a correction, why', () => {
    const problems = entryProblems(
      { ...start, takenBy: [], collectedOn: '', appraiser: ' ' },
      { hasInput: true, preview: null, correcting: true },
    )
    expect(Object.keys(problems).filter((key) => problems[key])).toEqual([
      'collectedOn',
      'takenBy',
      'appraiser',
      'reason',
    ])
  })
  it('starts a correction from the readings there are, as all of them', () => {
    const values = entryStart({
      planned: 3,
      kept: 0,
      texts: ['1', '2'],
      today: '2026-12-01',
      me: '',
      appraiser: 'A',
    })
    expect([values.typed, values.append, values.takenBy]).toEqual([['1', '2'], false, []])
  })
  it('says how a file was read', () => {
    const text = {
      ...{ kind: 'csv' as const, sheet: null, encoding: 'windows-1252' as const, byteOrderMark: false },
      ...{ separator: 'semicolon' as const, decimal: 'comma' as const, layout: 'long' as const },
      ...{ headerRows: 1, columns: ['B'], columnNames: ['Wert'] },
    }
    expect(readAsText(text, 'uploaded')).toBe(
      'column B “Wert”, semicolon between cells, decimal comma, Windows-1252, 1 row passed over at the top',
    )
    const workbook = {
      ...{ kind: 'xlsx' as const, sheet: 'Data', encoding: null, byteOrderMark: false, separator: null },
      ...{ decimal: 'point' as const, layout: 'wide' as const, headerRows: 0 },
      ...{ columns: ['B', 'C', 'D'], columnNames: [null, null, null] },
    }
    expect(readAsText(workbook, 'uploaded')).toBe('sheet “Data”, three columns, B to D, row by row')
  })
})

describe('planning', () => {
  it('reads a chance in per cent, with comma or point', () => {
    expect(chanceOf('90')).toBe(0.9)
    expect(chanceOf('99,9')).toBe(0.999)
    expect(chanceOf('0.5')).toBeUndefined()
    expect(chanceOf('100')).toBeUndefined()
    expect(chanceOf('')).toBeUndefined()
  })
  it('asks for a plan only once everything it rests on is there', () => {
    const asked = { taskIds: ['t'], unit: 'mm', bias: '0', standardDeviation: '0,001', chance: '90' }
    expect(planBody(asked)).toEqual({
      taskIds: ['t'],
      unit: 'mm',
      bias: '0',
      standardDeviation: '0,001',
      chance: 0.9,
    })
    expect(planBody({ ...asked, standardDeviation: '0' })).toBeNull()
    expect(planBody({ ...asked, bias: 'x' })).toBeNull()
    expect(planBody({ ...asked, taskIds: [] })).toBeNull()
  })
  it('answers with the number, or says why there is none', () => {
    const plan = (readings: number | null, ...reasons: studies.PlanReason[]) =>
      ({
        readings,
        tasks: [{ clauses: reasons.map((reason) => ({ reason })) }],
      }) as unknown as studies.StudyPlanned
    expect(planAnswer(plan(14, 'size-found'), 0.9).map(seen)).toEqual([
      '14 readings',
      'give each clause a chance of at least 90 % to be met, if bias and spread are as assumed.',
    ])
    expect(planAnswer(plan(14, 'size-found', 'size-does-not-help'), 0.9)[1]).toMatch(
      /^give each clause that more readings make surer/,
    )
    expect(planAnswer(plan(null, 'size-found', 'no-size-suffices'), 0.9)[0]).toBe(
      'No number of readings does, as assumed.',
    )
    expect(planAnswer(plan(null, 'not-about-size'), 0.9)[0]).toBe('No clause asks for a number.')
    expect(planAnswer(plan(null), 0.9)[0]).toBe('No criteria are in force.')
  })
  it('says what each clause takes', () => {
    expect(seen(planReasonText({ reason: 'size-found', readings: 14, chance: 0.912 }))).toBe(
      'at least 14 readings, then met with a chance of 91 %',
    )
    expect(planReasonText({ reason: 'minimum', readings: 15, chance: null })).toBe(
      'at least 15 readings, as agreed',
    )
  })
  it('names the next study of a gauge and reads slots line by line', () => {
    expect(suggestedCode('BG-14', 2)).toBe('BG-14 S3')
    expect(slotsOf(' 08:00 \n\n12:00\n')).toEqual(['08:00', '12:00'])
  })
})

describe('a study in a list', () => {
  it('has the verdict of its worst clause', () => {
    expect(verdictOf({ meets: 3, 'not-shown': 1 })).toEqual({ verdict: 'not-shown', met: 3, total: 4 })
    expect(verdictOf({ meets: 1, 'falls-short': 1, 'not-shown': 1 })?.verdict).toBe('falls-short')
    expect(verdictOf({ meets: 2 })).toEqual({ verdict: 'meets', met: 2, total: 2 })
  })
  it('has none before it is computed, or where nothing judges it', () => {
    expect(verdictOf(null)).toBeNull()
    expect(verdictOf({})).toBeNull()
  })
})

describe('a study that no clause judges', () => {
  const standard = {
    id: '',
    code: 'RS',
    name: '',
    certifiedValue: '1.000',
    unit: 'cm',
    expandedUncertainty: null,
    coverageFactor: null,
  }
  const text = (measuredAs: 'value' | 'deviation', values: number[]) => {
    const study = unjudgedStudy({ standard, measuredAs, unit: 'mm' }, { values })
    return study && seen(unjudgedText(study, 'mm'))
  }
  it('still tells its bias, against the standard in the unit of the readings', () =>
    expect(text('value', [10.01, 10.02, 10.03])).toBe(
      'The bias is 0.020 mm, its 95 % interval −0.005 to 0.045 mm.',
    ))
  it('takes deviations as they are', () =>
    expect(text('deviation', [0.01, 0.03])).toMatch(/^The bias is 0\.020 mm/))
  it('has nothing to tell without readings', () => expect(text('value', [])).toBeNull())
})
