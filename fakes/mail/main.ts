import { closeOnSignal, required } from '../page/environment'
import { createApp } from './app'
import { createReceiver } from './receiver'
import { MailStore } from './store'

const host = required('EVENRULE_HOST')
const store = new MailStore(required('MAIL_DATA'))
const receiver = createReceiver(store)
receiver.listen(Number(required('EVENRULE_SMTP_PORT')), host)
const server = createApp(store).listen(Number(required('EVENRULE_MAIL_PORT')), host)
closeOnSignal(() =>
  Promise.all([new Promise((done) => server.close(done)), new Promise<void>((done) => receiver.close(done))]),
)
