export * from './calendar'
export * from './scales'
