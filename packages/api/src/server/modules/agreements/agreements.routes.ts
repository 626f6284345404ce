import * as contract from '../../../contract/agreements'
import { tenantRoute, type Route } from '../../http/route'
import { criteriaOfTask } from './agreements.apply.service'
import { explanationOfTask } from './agreements.explain.service'
import { comment, mark, withdrawClausesOf } from './agreements.remark.service'
import { accept, withdraw } from './agreements.decide.service'
import { answer, begin, discard, save, send } from './agreements.draft.service'
import { listOfAgreements, readAgreementOf, scopedCharacteristics } from './agreements.read.service'
import { sign } from './agreements.sign.service'

export const agreementsRoutes: Route[] = [
  tenantRoute(contract.listAgreements, ({ tenant, query }) => listOfAgreements(tenant, query)),
  tenantRoute(contract.beginVersion, ({ tenant, body }) => begin(tenant, body)),
  tenantRoute(contract.readAgreement, ({ tenant, params }) => readAgreementOf(tenant, params.agreementId)),
  tenantRoute(contract.listScoped, ({ tenant, params, query }) =>
    scopedCharacteristics(tenant, params.agreementId, query),
  ),
  tenantRoute(contract.saveDraft, ({ tenant, params, body }) => save(tenant, params, body)),
  tenantRoute(contract.sendDraft, ({ tenant, params, body }) => send(tenant, params, body.expectedVersion)),
  tenantRoute(contract.discardDraft, ({ tenant, params, body }) =>
    discard(tenant, params, body.expectedVersion),
  ),
  tenantRoute(contract.answerRound, ({ tenant, params, body }) => answer(tenant, params, body)),
  tenantRoute(contract.withdrawClauses, ({ tenant, params, body }) =>
    withdrawClausesOf(tenant, params, body),
  ),
  tenantRoute(contract.commentOnRound, ({ tenant, params, body }) => comment(tenant, params, body)),
  tenantRoute(contract.markAccepted, ({ tenant, params, body }) => mark(tenant, params, body)),
  tenantRoute(contract.acceptRound, ({ tenant, params, body }) =>
    accept(tenant, params, body.expectedVersion),
  ),
  tenantRoute(contract.withdrawVersion, ({ tenant, params, body }) => withdraw(tenant, params, body)),
  tenantRoute(contract.signVersion, ({ tenant, params, body }) => sign(tenant, params, body)),
  tenantRoute(contract.readCriteria, ({ tenant, params, query }) =>
    criteriaOfTask(tenant, params.taskId, query),
  ),
  tenantRoute(contract.explainCriteria, ({ tenant, params, query }) =>
    explanationOfTask(tenant, params.taskId, query),
  ),
]
