/** What a released engine offers: the one entry of the computation and the text its answers are stored as. */
export { canonicalText } from './canonical'
export { evaluate } from './evaluate'
export { ENGINE_VERSION } from './version'
