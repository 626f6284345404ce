export * from './readings'
export * from './study-acts'
export * from './study-plan'
export * from './study-read'
