export { default as InvitationsSection } from './InvitationsSection.vue'
export { default as InvitationEntry } from './InvitationEntry.vue'
