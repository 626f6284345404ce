import * as contract from '../../../contract/submissions'
import { tenantRoute, type Route } from '../../http/route'
import { clear, judge } from './submissions.by-hand.service'
import { listOfSubmissions } from './submissions.list.service'
import { choose, discard, giveBack, prepare, send } from './submissions.prepare.service'
import { readSubmissionOf } from './submissions.read.service'
import { sign, withdraw } from './submissions.sign.service'
import { downloadOf, verify } from './submissions.verify.service'

export const submissionsRoutes: Route[] = [
  tenantRoute(contract.listSubmissions, ({ tenant, query }) => listOfSubmissions(tenant, query)),
  tenantRoute(contract.prepareSubmission, ({ tenant, body }) => prepare(tenant, body)),
  tenantRoute(contract.readSubmission, ({ tenant, params, query }) =>
    readSubmissionOf(tenant, params.submissionId, query.revision),
  ),
  tenantRoute(contract.chooseStudies, ({ tenant, params, body }) =>
    choose(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.judgeByHand, ({ tenant, params, body }) =>
    judge(tenant, params.submissionId, params.clauseKey, body),
  ),
  tenantRoute(contract.clearByHand, ({ tenant, params, body }) =>
    clear(tenant, params.submissionId, params.clauseKey, body),
  ),
  tenantRoute(contract.sendForSignature, ({ tenant, params, body }) =>
    send(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.returnSubmission, ({ tenant, params, body }) =>
    giveBack(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.signSubmission, ({ tenant, params, body }) => sign(tenant, params.submissionId, body)),
  tenantRoute(contract.discardSubmission, ({ tenant, params, body }) =>
    discard(tenant, params.submissionId, body.expectedVersion),
  ),
  tenantRoute(contract.withdrawSubmission, ({ tenant, params, body }) =>
    withdraw(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.verifySubmission, ({ tenant, params }) => verify(tenant, params.submissionId)),
  tenantRoute(contract.downloadSubmissionFile, ({ tenant, params }) =>
    downloadOf(tenant, params.submissionId, params.fileId),
  ),
]
