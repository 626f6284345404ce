export { default as PartPage } from './PartPage.vue'
export { default as PartsPage } from './PartsPage.vue'
export { default as ProofWord } from './ProofWord.vue'
export { characteristicText, decimalForReading, toleranceText, withUnit } from './tolerance'
