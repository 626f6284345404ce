export interface FieldError {
  /** Where in the input: `body.readings[3]`. */
  path: string
  message: string
  row?: number
  column?: string
}

/** An error the caller can act on. The middleware turns it into `application/problem+json`. */
export class ProblemError extends Error {
  constructor(
    readonly code: string,
    readonly status: number,
    message: string,
    readonly errors?: readonly FieldError[],
    /** What stands now where somebody else changed it; in the shape that the endpoint's contract names. */
    readonly current?: Readonly<Record<string, unknown>>,
  ) {
    super(message)
    this.name = 'ProblemError'
  }
}

/** Makes the constructor of one kind of error, with its stable code and status. The detail says what to do. */
export const defineError =
  <A extends unknown[]>(code: string, status: number, message: string | ((...args: A) => string)) =>
  (...args: A): ProblemError =>
    new ProblemError(code, status, typeof message === 'string' ? message : message(...args))

/** The same error, with what stands now, so that what was typed and what is stored can be put together. */
export const withCurrent = (
  { code, status, message, errors }: ProblemError,
  current: Readonly<Record<string, unknown>>,
): ProblemError => new ProblemError(code, status, message, errors, current)

export const notFound = defineError(
  'not-found',
  404,
  (what: string) => `There is no ${what} here that you may see. Check the address, or go back to the list.`,
)
export const changedMeanwhile = defineError(
  'changed-meanwhile',
  409,
  (what: string) =>
    `Somebody changed this ${what} since you opened it. Load it again; what you typed is kept.`,
)
export const wrongState = defineError(
  'wrong-state',
  409,
  (what: string, state: string) =>
    `This ${what} is ${state} now, so that is no longer possible. Load it again.`,
)
/** Bad input found by a rule that the contract's schema cannot express. */
export const invalidInput = (errors: readonly FieldError[]): ProblemError =>
  new ProblemError('invalid-input', 422, 'Some fields need another look.', errors)
