/** Types of the computation, by what they describe; this file is their one door. */
export * from './types/clauses'
export * from './types/codes'
export * from './types/facts'
export * from './types/outputs'
export * from './types/rules'
export * from './types/studies'
