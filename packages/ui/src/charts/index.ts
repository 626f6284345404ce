export * from './scales'
