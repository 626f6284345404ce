import * as contract from '../../../contract/reviews'
import { tenantRoute, type Route } from '../../http/route'
import { answer, challenge, reply, settle, withdraw } from './challenges.service'
import {
  acceptOnConditions,
  acceptSubmission,
  confirmAcceptance,
  refuseSubmission,
  sendBackToReview,
} from './decisions.service'

export const reviewsRoutes: Route[] = [
  tenantRoute(contract.accept, ({ tenant, params, body }) =>
    acceptSubmission(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.acceptWithConditions, ({ tenant, params, body }) =>
    acceptOnConditions(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.refuse, ({ tenant, params, body }) =>
    refuseSubmission(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.confirm, ({ tenant, params, body }) =>
    confirmAcceptance(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.sendBack, ({ tenant, params, body }) =>
    sendBackToReview(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.openChallenge, ({ tenant, params, body }) =>
    challenge(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.answerChallenge, ({ tenant, params, body }) =>
    answer(tenant, params.submissionId, params.challengeId, body),
  ),
  tenantRoute(contract.replyToAnswer, ({ tenant, params, body }) =>
    reply(tenant, params.submissionId, params.challengeId, body),
  ),
  tenantRoute(contract.settleChallenge, ({ tenant, params, body }) =>
    settle(tenant, params.submissionId, params.challengeId, body),
  ),
  tenantRoute(contract.withdrawChallenge, ({ tenant, params, body }) =>
    withdraw(tenant, params.submissionId, params.challengeId, body),
  ),
]
