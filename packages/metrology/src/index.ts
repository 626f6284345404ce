export * from './types'
export { ENGINE_VERSION } from './version'
