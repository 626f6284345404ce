import { front } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startHarness, type Harness } from './harness'

describe('an empty organisation', () => {
  let harness: Harness
  beforeAll(async () => {
    harness = await startHarness()
  })
  afterAll(() => harness.stop())

  it.each(['supplier', 'customer'] as const)('is waited for with nothing on the %s side', async (side) => {
    const person = await harness.person(`Reader ${side}`)
    const organisation = await harness.organisation(`Alone ${side}`, [[person, ['reader']]])
    const params = { organisationId: organisation.id }
    const act = harness.as(side, person)
    expect(await act.call(front.readCounts, params)).toEqual({
      waiting: 0,
      agreements: 0,
      requests: 0,
      messages: 0,
    })
    expect(await act.call(front.listWaiting, params)).toEqual({
      items: [],
      total: 0,
      page: 1,
      size: 25,
      oldestDays: 0,
      overdue: 0,
      safety: 0,
    })
    expect((await act.call(front.listCoverage, params)).total).toBe(0)
  })
})
