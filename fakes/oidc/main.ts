import { closeOnSignal, required } from '../page/environment'
import { createApp } from './app'
import { keepKeys } from './keys'

const app = createApp({
  issuer: required('OIDC_ISSUER'),
  keys: keepKeys(required('OIDC_DATA')),
  apps: [
    {
      name: 'supplier',
      origin: required('SUPPLIER_ORIGIN'),
      clientId: required('OIDC_SUPPLIER_CLIENT_ID'),
      clientSecret: required('OIDC_SUPPLIER_CLIENT_SECRET'),
    },
    {
      name: 'customer',
      origin: required('CUSTOMER_ORIGIN'),
      clientId: required('OIDC_CUSTOMER_CLIENT_ID'),
      clientSecret: required('OIDC_CUSTOMER_CLIENT_SECRET'),
    },
  ],
})
const server = app.listen(Number(required('EVENRULE_OIDC_PORT')), required('EVENRULE_HOST'))
closeOnSignal(() => new Promise((done) => server.close(done)))
