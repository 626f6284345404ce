import type { Page } from 'playwright-core'
import { ask, dayIn } from './support'

/** Part numbers and equipment of a story that must not meet those of others. */
export interface World {
  part: string
  gauge: string
  partId: string
  gaugeId: string
  taskId: string
  standardId: string
}
type Made = { id: string }

/** A part number of the customer's with one characteristic. */
async function enterPart(customer: Page, part: string, supplier: string) {
  const { items } = await ask<{ items: { id: string; partner: { name: string } }[] }>(
    customer,
    'relationships?size=100',
  )
  const relationshipId = items.find((each) => each.partner.name === supplier)?.id
  const made = await ask<Made & { currentRevision: Made }>(customer, 'parts', {
    body: { relationshipId, number: part, name: 'Spring cup', revision: 'A' },
  })
  const characteristic = await ask<Made>(
    customer,
    `parts/${made.id}/revisions/${made.currentRevision.id}/characteristics`,
    {
      body: {
        ...{ number: 1, name: 'Cup height', nominal: '12.00', lowerLimit: '11.90', upperLimit: '12.10' },
        ...{ unit: 'mm', class: 'ordinary' },
      },
    },
  )
  return { partId: made.id, characteristicId: characteristic.id }
}

/** Enters what the story is about: part, calibrated gauge and reference standard, and the measuring task. */
export async function enterWorld(customer: Page, supplier: Page, partner: string): Promise<World> {
  const mark = Date.now().toString(36)
  const part = `STD-${mark}`
  const gauge = `HG-${mark}`
  const { partId, characteristicId } = await enterPart(customer, part, partner)
  const { id: gaugeId } = await ask<Made>(supplier, 'gauges', {
    body: { code: gauge, name: 'Height gauge', resolution: '0.001', unit: 'mm' },
  })
  const { id: standardId } = await ask<Made>(supplier, 'standards', {
    body: {
      ...{ code: `RS-${mark}`, name: 'Gauge block', certifiedValue: '12.0000', unit: 'mm' },
      ...{ expandedUncertainty: '0.0006', coverageFactor: '2' },
    },
  })
  const calibrated = { calibratedOn: dayIn(-100), dueOn: dayIn(200), foundWithinLimits: true }
  for (const of of [`gauges/${gaugeId}`, `standards/${standardId}`])
    await ask(supplier, `${of}/calibrations`, { data: { ...calibrated, certificateNumber: `C ${mark}` } })
  const { id: taskId } = await ask<Made>(supplier, 'tasks', {
    body: { characteristicId, gaugeId, site: 'Coiling' },
  })
  return { part, gauge, partId, gaugeId, taskId, standardId }
}

/** A study of the measuring task with readings close to the certified value, taken by a colleague. */
export async function takeReadings(supplier: Page, { taskId, standardId, part }: World, takenBy: string) {
  const { items } = await ask<{ items: (Made & { name: string })[] }>(supplier, 'members?size=100')
  const member = items.find(({ name }) => name === takenBy)
  const offsets = [1, 0, 2, -1, 1, 3, 0, 1, -2, 1, 2, 0, 1, -1, 0, 2, 1, 0, 3, 1, -1, 1, 0, 2, 1]
  const study = await ask<Made & { rowVersion: number }>(supplier, 'studies', {
    body: {
      ...{ code: `BS ${part}`, taskIds: [taskId], standardId, plannedReadings: offsets.length },
      ...{ unit: 'mm', measuredAs: 'value' },
    },
  })
  await ask(supplier, `studies/${study.id}/readings`, {
    data: {
      ...{ source: 'typed', text: offsets.map((offset) => (12 + offset / 1000).toFixed(3)).join('\n') },
      ...{ expectedVersion: study.rowVersion, complete: true, collectedOn: dayIn(0), appraiser: 'A' },
      takenBy: [member?.id],
    },
  })
}
