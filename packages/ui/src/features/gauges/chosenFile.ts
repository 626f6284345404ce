import { files } from '@evenrule/api/contract'
import { calibrationWords as words } from '../../strings/gauges'

/** What is wrong with a chosen file before it is sent; `kept` is the name that a draft remembers of it. */
export function fileProblem(file: File | undefined, kept: string): string | undefined {
  if (file) return file.size > files.largestFile ? words.fileTooLarge : undefined
  return kept ? words.fileAgain(kept) : undefined
}
