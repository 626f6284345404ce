/** Verdicts that a person gives by hand; without a judgement the clause is not shown. */
export const byHandVerdicts = ['meets', 'falls-short', 'not-shown'] as const
export type ByHandVerdict = (typeof byHandVerdicts)[number]
