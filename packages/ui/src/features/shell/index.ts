export { default as EvenruleApp } from './EvenruleApp.vue'
export { customerNavigation, supplierNavigation, type Navigation } from './navigation'
export { startApp, type AppOptions } from './startApp'
export { useCountsStore } from './useCountsStore'
