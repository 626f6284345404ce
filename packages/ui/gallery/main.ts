import '@evenrule/ui/base.css'
import { createEvenruleVuetify, type Side } from '@evenrule/ui'
import { createApp } from 'vue'
import { createRouter, createWebHashHistory } from 'vue-router'
import GalleryApp from './GalleryApp.vue'

const side: Side = new URLSearchParams(location.search).get('side') === 'customer' ? 'customer' : 'supplier'

const router = createRouter({
  history: createWebHashHistory(),
  routes: [
    { path: '/', redirect: '/study' },
    { path: '/study', component: () => import('./pages/StudyPage.vue') },
    { path: '/desk', component: () => import('./pages/DeskPage.vue') },
    { path: '/forms', component: () => import('./pages/FormsPage.vue') },
    { path: '/tables', component: () => import('./pages/TablesPage.vue') },
    { path: '/states', component: () => import('./pages/StatesPage.vue') },
    { path: '/:rest(.*)', component: () => import('./pages/StatesPage.vue') },
  ],
})

createApp(GalleryApp, { side }).use(router).use(createEvenruleVuetify({ side })).mount('#app')
