import type { Logger } from 'pino'
import type { Engines } from './integrations/engines'
import type { FileStore } from './integrations/file-store'

/** What services of the modules use beside their transaction; handed over so that tests can replace each. */
export interface Services {
  clock: () => Date
  files: FileStore
  engines: Engines
  logger: Logger
}
