export * from './theme'
export * from './shell'
