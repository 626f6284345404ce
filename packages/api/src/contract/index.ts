export * from './access'
export * from './common'
export * from './define'
export * as system from './system'
