import * as contract from '../../../contract/reviews'
import { tenantRoute, type Route } from '../../http/route'
import {
  agreeToLeave,
  answer,
  challenge,
  declineToLeave,
  proposeToLeave,
  reply,
  settle,
  withdraw,
} from './challenges.service'
import * as conditions from './conditions.service'
import { askToSign, correct, correctionOf } from './corrections.service'
import { agree, decline } from './decisions.one-off.service'
import {
  acceptOnConditions,
  acceptSubmission,
  confirmAcceptance,
  refuseSubmission,
  sendBackToReview,
} from './decisions.service'

const decisions: Route[] = [
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
  tenantRoute(contract.agreeOneOff, ({ tenant, params, body }) => agree(tenant, params.submissionId, body)),
  tenantRoute(contract.declineOneOff, ({ tenant, params, body }) =>
    decline(tenant, params.submissionId, body),
  ),
]

const challenges: Route[] = [
  tenantRoute(contract.openChallenge, ({ tenant, params, body }) =>
    challenge(tenant, params.submissionId, body),
  ),
  tenantRoute(contract.answerChallenge, ({ tenant, params: { submissionId, challengeId }, body }) =>
    answer(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.replyToAnswer, ({ tenant, params: { submissionId, challengeId }, body }) =>
    reply(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.settleChallenge, ({ tenant, params: { submissionId, challengeId }, body }) =>
    settle(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.withdrawChallenge, ({ tenant, params: { submissionId, challengeId }, body }) =>
    withdraw(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.proposeUnresolved, ({ tenant, params: { submissionId, challengeId }, body }) =>
    proposeToLeave(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.agreeUnresolved, ({ tenant, params: { submissionId, challengeId }, body }) =>
    agreeToLeave(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.declineUnresolved, ({ tenant, params: { submissionId, challengeId }, body }) =>
    declineToLeave(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.readCorrection, ({ tenant, params: { submissionId, challengeId } }) =>
    correctionOf(tenant, submissionId, challengeId),
  ),
  tenantRoute(contract.askForCorrection, ({ tenant, params: { submissionId, challengeId }, body }) =>
    askToSign(tenant, submissionId, challengeId, body),
  ),
  tenantRoute(contract.signCorrection, ({ tenant, params: { submissionId, challengeId }, body }) =>
    correct(tenant, submissionId, challengeId, body),
  ),
]

const ofConditions: Route[] = [
  tenantRoute(contract.reportCondition, ({ tenant, params: { submissionId, conditionId }, body }) =>
    conditions.report(tenant, submissionId, conditionId, body),
  ),
  tenantRoute(contract.confirmCondition, ({ tenant, params: { submissionId, conditionId }, body }) =>
    conditions.confirm(tenant, submissionId, conditionId, body),
  ),
  tenantRoute(contract.returnCondition, ({ tenant, params: { submissionId, conditionId }, body }) =>
    conditions.giveBack(tenant, submissionId, conditionId, body),
  ),
]

export const reviewsRoutes: Route[] = [...decisions, ...challenges, ...ofConditions]
