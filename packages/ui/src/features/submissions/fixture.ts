import type { submissions } from '@evenrule/api/contract'
import {
  canonicalText,
  evaluate,
  type Clause,
  type ClauseInput,
  type ClauseOutput,
} from '@evenrule/metrology'
import { defaultTerms } from '@evenrule/api/contract/terms'
import { sha256Of } from '@evenrule/api/contract/submission-check'
import type { Content } from './reading'

/** A submission for tests, computed by the real computation from readings named in the test. */
const id = '01890a5d-ac96-774b-bcce-b302099a8057'

const clauses: Clause[] = [
  {
    type: 'bias-equivalence',
    parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
  },
  { type: 'resolution-share', parameters: { share: 0.05, base: 'tolerance' } },
]

export interface FixtureOptions {
  texts: string[]
  class?: Content['characteristic']['class']
  engineSha256: string
  clauses?: Clause[]
}

export async function submissionOf({
  texts,
  engineSha256,
  class: safety = 'ordinary',
  clauses: agreed = clauses,
}: FixtureOptions): Promise<submissions.Submission> {
  const evaluations = await Promise.all(
    agreed.map(async (clause) => {
      const input: ClauseInput = {
        kind: 'clause',
        unit: 'mm',
        tolerance: { lower: 23.975, upper: 24.025 },
        resolution: 0.001,
        clause,
        data: { kind: 'bias', readings: texts.map(Number), reference: { value: 24 } },
      }
      const output = evaluate(input) as ClauseOutput
      const outputText = canonicalText(output)
      return {
        clause,
        output,
        stored: {
          clauseKey: output.clauseKey,
          advisory: false,
          inputText: canonicalText(input),
          outputText,
          outputSha256: await sha256Of(outputText),
          engineVersion: '0.1.0',
          engineSha256,
        },
      }
    }),
  )
  const text = canonicalText(await contentOf(texts, safety, evaluations))
  const sha256 = await sha256Of(text)
  return {
    id,
    number: 7,
    state: 'submitted',
    rowVersion: 3,
    ageDays: 6,
    today: '2026-11-08',
    criteria: 'agreed',
    standing: null,
    revision: 1,
    revisions: [],
    byHand: [],
    relationshipId: id,
    taskId: id,
    partId: id,
    characteristicId: id,
    safety: safety === 'safety',
    verdict: 'meets',
    clausesMet: evaluations.filter(({ output }) => output.verdict === 'meets').length,
    clausesTotal: evaluations.length,
    createdAt: '2026-11-01T08:00:00.000Z',
    sentForSignatureAt: '2026-11-01T09:00:00.000Z',
    submittedAt: '2026-11-02T08:00:00.000Z',
    decidedAt: null,
    withdrawalReason: null,
    supersededBy: null,
    text,
    sha256,
    evaluations: evaluations.map(({ stored }) => stored),
    files: [],
    signatures: [
      {
        side: 'supplier',
        name: 'Tomas',
        meaning: 'submits',
        sha256,
        signedAt: '2026-11-02T08:00:00.000Z',
        revision: 1,
      },
    ],
    decisions: [],
    challenges: [],
    notes: [],
    choices: [],
    hindrances: [],
  }
}

type Computed = { clause: Clause; output: ClauseOutput; stored: submissions.SubmissionEvaluation }[]

async function contentOf(
  texts: string[],
  safety: Content['characteristic']['class'],
  computed: Computed,
): Promise<Content> {
  return {
    format: 'evenrule.submission/1',
    number: 7,
    revision: 1,
    corrects: null,
    criteria: 'agreed',
    terms: defaultTerms,
    houseTerms: null,
    advisory: [],
    byHand: [],
    requests: [],
    criteriaOn: '2026-11-02',
    relationship: {
      id,
      supplier: { id, name: 'Tarnfield Turned Parts' },
      customer: { id, name: 'Brackwell Drivelines' },
      timeZone: 'Europe/Berlin',
    },
    characteristic: {
      characteristicId: id,
      partNumber: '7741-220',
      revision: 'C',
      number: 5,
      name: 'Bore Ø',
      nominal: '24.000',
      lowerLimit: '23.975',
      upperLimit: '24.025',
      unit: 'mm',
      class: safety,
      processStandardDeviation: null,
    },
    part: { id, name: 'Output shaft' },
    task: {
      id,
      gaugeCode: 'BG-14',
      gaugeName: 'Bore gauge',
      gaugeResolution: '0.001',
      gaugeUnit: 'mm',
      site: null,
      processStep: 'OP 40',
    },
    agreements: [],
    clauses: await Promise.all(
      computed.map(async ({ clause, output, stored }) => ({
        clauseKey: stored.clauseKey,
        clause,
        agreementNumber: 3,
        versionNumber: 1,
        versionId: id,
        scope: 'part' as const,
        study: clause.type === 'resolution-share' ? null : 'S-1',
        verdict: output.verdict,
        inputSha256: await sha256Of(stored.inputText),
        outputSha256: stored.outputSha256,
        engineVersion: stored.engineVersion,
        engineSha256: stored.engineSha256,
      })),
    ),
    studies: [
      {
        code: 'S-1',
        kind: 'bias',
        attempt: 1,
        registeredAt: '2026-10-09T08:00:00.000Z',
        registeredBeforehand: true,
        plannedReadings: texts.length,
        unit: 'mm',
        measuredAs: 'value',
        gauge: { code: 'BG-14', name: 'Bore gauge', resolution: '0.001', unit: 'mm' },
        standard: {
          code: 'R-1',
          name: 'Ring',
          certifiedValue: '24.000',
          unit: 'mm',
          expandedUncertainty: null,
          coverageFactor: '2',
        },
        calibration: { gauge: null, standard: null },
        data: {
          revision: 1,
          reason: null,
          leftOut: [],
          source: 'typed',
          collectedOn: '2026-10-10',
          appraiser: 'A',
          readings: texts,
          sha256: await sha256Of(JSON.stringify(texts)),
          fileSha256: null,
        },
      },
    ],
    attemptsSince: '2026-10-01',
    attempts: [],
    files: [],
  }
}
