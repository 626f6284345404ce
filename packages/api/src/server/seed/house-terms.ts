import { beginHouseTerms, offerHouseTerms, publishHouseTerms } from '../../contract/house-terms'
import { memberWith, relationshipOf, workerOf, type Base } from './base'
import type { Ids } from './ids'
import { houseTermsName } from './ids'
import { houseTerms, type DemoHouseTerms } from './scenario.house-terms'
import type { Scene } from './scenes'
import type { Stage } from './stage'

/** The scenes in which customers write, publish and offer their house terms. */
export function houseTermsScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  return houseTerms.flatMap((version) => {
    const { customer, daysAgo, clauses, terms, words, published, offered } = version
    const organisation = base.organisations[customer]
    const act = stage.as('customer', organisation, memberWith(organisation, workerOf.customer))
    let id = ''
    const written: Scene = {
      daysAgo,
      play: async () => {
        const draft = await act(beginHouseTerms, { body: { clauses, terms, words } })
        ;({ id } = draft)
        if (!published) return
        const params = { houseTermsId: id }
        const { number } = await act(publishHouseTerms, {
          params,
          body: { expectedVersion: draft.rowVersion },
        })
        ids.set('house terms', houseTermsName(customer, number ?? 0), id)
      },
    }
    return offered ? [written, offering(offered, () => id)] : [written]

    function offering(offer: NonNullable<DemoHouseTerms['offered']>, idOf: () => string): Scene {
      return {
        daysAgo: offer.daysAgo,
        play: async () => {
          const { refused } = await act(offerHouseTerms, {
            params: { houseTermsId: idOf() },
            body: {
              relationshipIds: offer.to.map((supplier) => relationshipOf(base, supplier, customer).id),
              effectiveOn: stage.day(offer.effectiveDaysAgo),
              comment: offer.comment,
            },
          })
          if (refused.length > 0) throw new Error('House terms of the demonstration were not offered.')
        },
      }
    }
  })
}
