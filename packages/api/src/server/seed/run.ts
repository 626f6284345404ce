import { agreementScenes } from './agreements'
import type { Base } from './base'
import { gaugeScenes, standardScenes } from './gauges'
import { houseTermsScenes } from './house-terms'
import { Ids } from './ids'
import { invitationScenes } from './invitations'
import { lifeScenes } from './life'
import { partScenes } from './parts'
import { requestScenes } from './requests'
import { inOrder } from './scenes'
import type { Stage } from './stage'
import { studyScenes } from './studies'
import { taskScenes } from './tasks'

/** Plays the demonstration from its beginning a year ago to today, in the order of its days. */
export async function playDemonstration(stage: Stage, base: Base): Promise<void> {
  const ids = new Ids()
  const scenes = [
    partScenes,
    gaugeScenes,
    standardScenes,
    taskScenes,
    houseTermsScenes,
    agreementScenes,
    requestScenes,
    studyScenes,
    lifeScenes,
    invitationScenes,
  ].flatMap((scenesOf) => scenesOf(stage, base, ids))
  let day = Infinity
  for (const scene of inOrder(scenes)) {
    if (scene.daysAgo === day) stage.pass(5)
    else stage.daysAgo(scene.daysAgo)
    day = scene.daysAgo
    await scene.play()
  }
}
