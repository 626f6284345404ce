export { default as MembersPage } from './MembersPage.vue'
