export { default as StudyWhatIf } from './StudyWhatIf.vue'
export { default as WhatIfQuoteView } from './WhatIfQuoteView.vue'
export { default as WhatIfSection } from './WhatIfSection.vue'
export { clauseOf, type WhatIfQuote } from './quote'
