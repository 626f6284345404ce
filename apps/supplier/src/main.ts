import '@evenrule/ui/base.css'
import { startApp } from '@evenrule/ui/features/shell'
import App from './App.vue'
import { routes } from './router'

startApp({ side: 'supplier', root: App, routes })
