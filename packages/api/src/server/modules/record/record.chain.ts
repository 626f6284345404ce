import type { RecordCheck, RecordFault } from '../../../contract/record'
import type { Tenant } from '../../db/tenant'
import { genesisHash } from './record.append'
import { contentOf, faultOf, type Link } from './record.check'
import { isAsFrozen, sealedBy } from './record.frozen'
import { selectFrozen } from './record.frozen.repository'
import { selectChainAfter, selectChainEnd, type ChainEnd, type EventRow } from './record.repository'

/** Events read at a time while a chain is recomputed. */
const batch = 500

/**
 * Recomputes a chain from its first event, compares what each event froze with what lies in the database, and the end
 * of the chain with its head. It reads through a transaction that may see the chain: a tenant's, or the owner's.
 */
export async function recomputeChain(
  reader: Pick<Tenant, 'tx'>,
  chainId: string,
  knownHash?: string,
): Promise<RecordCheck> {
  const link: Link = { chainId, sequence: 0, hash: genesisHash }
  let last: RecordCheck['last'] = null
  let known: RecordCheck['known'] = null
  const broken = (
    sequence: number,
    fault: NonNullable<RecordCheck['broken']>['fault'],
    type: string | null,
  ) => ({
    ...{ chainId, sound: link.sequence, last, known },
    broken: { sequence, fault, type },
  })
  for (;;) {
    const events = await selectChainAfter(reader, chainId, link.sequence, batch)
    for (const event of events) {
      const fault = faultOf(event, link) ?? (await frozenFault(reader, event))
      if (fault === 'missing') return broken(link.sequence + 1, fault, null)
      if (fault) return broken(event.sequence, fault, event.type)
      Object.assign(link, { sequence: event.sequence, hash: event.hash })
      last = lastOf(event)
      if (event.hash === knownHash) known = { sequence: event.sequence, at: event.at }
    }
    if (events.length === batch) continue
    const end = await selectChainEnd(reader, chainId)
    // Somebody appended while this read: go on with what is new.
    if (end.last > link.sequence) continue
    const fault = faultAtEnd(end, link)
    if (!fault) return { chainId, sound: link.sequence, last, known, broken: null }
    if (fault.fault === 'added') {
      // Events past the head follow from each other, but nobody vouches for them.
      const [sound] = await selectChainAfter(reader, chainId, fault.sequence - 2, 1)
      link.sequence = fault.sequence - 1
      last = sound && sound.sequence < fault.sequence ? lastOf(sound) : null
    }
    return broken(fault.sequence, fault.fault, null)
  }
}

const lastOf = ({ sequence, at, hash }: EventRow) => ({ sequence, at, hash })

/** Whether the head tells of the same last event: one cut off, or one added past it, shows here. */
function faultAtEnd({ head }: ChainEnd, { sequence, hash }: Link) {
  if (!head) return sequence === 0 ? null : { sequence, fault: 'end-missing' as const }
  if (head.sequence > sequence) return { sequence: sequence + 1, fault: 'missing' as const }
  if (head.sequence < sequence) return { sequence: head.sequence + 1, fault: 'added' as const }
  return head.hash === hash ? null : { sequence, fault: 'end-changed' as const }
}

/** Whether what an event froze has been altered since, though the event itself is whole. */
async function frozenFault(reader: Pick<Tenant, 'tx'>, event: EventRow): Promise<RecordFault | null> {
  const data = contentOf(event.text)?.data
  const sealed = sealedBy({ ...event, data })
  if (!sealed || !data) return null
  return isAsFrozen(data, await selectFrozen(reader, sealed)) ? null : 'frozen-changed'
}
