export { default as HouseTermsListPage } from './HouseTermsListPage.vue'
export { default as HouseTermsPage } from './HouseTermsPage.vue'
