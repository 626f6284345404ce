import type { StudyKind, StudyKindDescriptor } from '../types'
import { biasStudy } from './bias'

/** Every kind of study there is. A new one is a file beside this and a line here. */
export const studyKinds: { [K in StudyKind]: StudyKindDescriptor<K> } = {
  bias: biasStudy,
}
