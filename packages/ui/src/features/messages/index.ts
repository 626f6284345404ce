export { default as MessagesPage } from './MessagesPage.vue'
