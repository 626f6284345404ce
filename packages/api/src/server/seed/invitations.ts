import { inviteMember, inviteSupplier } from '../../contract/invitations'
import { memberWith, type Base } from './base'
import { invitedMembers, invitedSuppliers } from './scenario.invitations'
import type { Scene } from './scenes'
import type { Stage } from './stage'

/** Invitations that are open, or have run out, so that anybody can try what follows. */
export const invitationScenes = (stage: Stage, base: Base): Scene[] => [
  ...invitedSuppliers.map(({ by, daysAgo, ...body }) => ({
    daysAgo,
    play: async () => {
      const organisation = base.organisations[by]
      const invite = stage.as('customer', organisation, memberWith(organisation, 'admin'))
      await invite(inviteSupplier, { body })
    },
  })),
  ...invitedMembers.map(({ by, side, daysAgo, lastDay, ...body }) => ({
    daysAgo,
    play: async () => {
      const organisation = base.organisations[by]
      const invite = stage.as(side, organisation, memberWith(organisation, 'admin'))
      await invite(inviteMember, { body: { ...body, endsOn: stage.day(-lastDay) } })
    },
  })),
]
