// Where the server runs from its source, threads read TypeScript too; workers do not take that over by themselves.
import { register } from 'tsx/esm/api'

register()
await import('./thread.ts')
