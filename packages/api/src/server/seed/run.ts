import type { Base } from './base'
import { seedGauges } from './gauges'
import { seedParts } from './parts'
import type { Stage } from './stage'

/** Plays the demonstration from its beginning a year ago to today. */
export async function playDemonstration(stage: Stage, base: Base): Promise<void> {
  const characteristics = await seedParts(stage, base)
  await seedGauges(stage, base, characteristics)
}
