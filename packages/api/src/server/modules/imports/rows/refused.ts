import { ProblemError } from '../../../errors'

/** What a rule of the single act says where it refuses; undefined where it allows. */
export async function refusalOf(rule: () => unknown): Promise<string | undefined> {
  try {
    await rule()
    return undefined
  } catch (error) {
    if (error instanceof ProblemError) return wordsOf(error)
    throw error
  }
}

/** The words of a refusal: those at the field where there are any. */
export const wordsOf = ({ errors, message }: ProblemError): string => errors?.[0]?.message ?? message
