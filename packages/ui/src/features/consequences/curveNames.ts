import type { Clause } from '@evenrule/metrology'
import type { CurveStyle } from '../../charts/curves'
import { ruleNames } from '../../strings/consequences'

/** One of two clauses compared, as it is named and drawn. */
export interface NamedCurve<Of> {
  /** Beside its curve. */
  label: string
  /** In a sentence. */
  spoken: string
  style: CurveStyle
  of: Of
}

/**
 * The proposal solid, the one in force dashed, what rewards the wrong thing in rust; the proposal first. Two rules are
 * told apart by their names too, two figures of one rule by whose they are alone.
 */
export function curveNames<Of extends { clause: Clause; perverse: boolean }>(
  { before, after }: { before: Of | null; after: Of | null },
  names: { before: string; after: string },
): NamedCurve<Of>[] {
  const same = before?.clause.type === after?.clause.type
  const named = (of: Of, name: string, style: CurveStyle): NamedCurve<Of> => ({
    label: same ? name : `${ruleNames[of.clause.type]}, ${name}`,
    spoken: same ? name : ruleNames[of.clause.type],
    style,
    of,
  })
  return [
    ...(after ? [named(after, names.after, after.perverse ? 'rust' : 'solid')] : []),
    ...(before ? [named(before, names.before, before.perverse ? 'rust-dashed' : 'dashed')] : []),
  ]
}
