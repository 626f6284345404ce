import { agreementScenes } from './agreements'
import type { Base } from './base'
import { seedGauges } from './gauges'
import { seedParts } from './parts'
import { inOrder } from './scenes'
import type { Stage } from './stage'
import { studyScenes } from './studies'

/** Plays the demonstration from its beginning a year ago to today. */
export async function playDemonstration(stage: Stage, base: Base): Promise<void> {
  const characteristics = await seedParts(stage, base)
  const tasks = await seedGauges(stage, base, characteristics)
  const scenes = [...agreementScenes(stage, base, characteristics), ...studyScenes(stage, base, tasks)]
  let day = Infinity
  for (const scene of inOrder(scenes)) {
    if (scene.daysAgo === day) stage.pass(20)
    else stage.daysAgo(scene.daysAgo)
    day = scene.daysAgo
    await scene.play()
  }
}
