export { default as AgreementPage } from './AgreementPage.vue'
export { default as AgreementsPage } from './AgreementsPage.vue'
export { default as AppliesPage } from './AppliesPage.vue'
