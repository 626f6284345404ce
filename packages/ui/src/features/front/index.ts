export { default as FrontPage } from './FrontPage.vue'
