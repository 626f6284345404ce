import { isOverdue, type Condition } from '../../../contract/conditions'
import type { ConditionReportRow, ConditionRow } from './conditions.repository'
import { attachmentsOf } from './review-files.read'
import type { ReviewFileRow } from './review-files.repository'

/** Conditions with what was reported of each. */
export const conditionAnswers = (
  rows: readonly ConditionRow[],
  reports: readonly ConditionReportRow[],
  files: readonly ReviewFileRow[],
  nameOf: (userId: string | null) => string | null,
  today: string,
): Condition[] =>
  rows.map(({ id, number, text, dueOn, owner, followUp, state, confirmedAt, rowVersion }) => ({
    ...{ id, number, text, dueOn, owner, followUp, state, confirmedAt, rowVersion },
    overdue: isOverdue({ dueOn, state }, today),
    reports: reports
      .filter(({ conditionId }) => conditionId === id)
      .map((report) => ({
        ...{ id: report.id, move: report.move, side: report.side, text: report.text },
        name: nameOf(report.userId),
        files: attachmentsOf(files.filter(({ reportId }) => reportId === report.id)),
        createdAt: report.createdAt,
      })),
  }))
