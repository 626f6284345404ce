import { files, submissions } from '@evenrule/api/contract'
import { useApi } from '../../session/client'
import { useHere } from '../common'

type ShownFile = Pick<submissions.Submission['files'][number], 'id' | 'ownFileId'>

/** Where a file of a submission is opened: the frozen one, or before signing the supplier's own. */
export function useFileAddress() {
  const api = useApi()
  const here = useHere()
  return (submissionId: string, { id, ownFileId }: ShownFile): string | undefined => {
    if (id !== null)
      return api.url(submissions.downloadSubmissionFile, {
        params: here.params({ submissionId, fileId: id }),
      })
    return ownFileId === null
      ? undefined
      : api.url(files.downloadFile, { params: here.params({ fileId: ownFileId }) })
  }
}
