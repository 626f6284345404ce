/** An input that cannot be computed: a stable code, what is wrong and how to mend it, and where it stands. */
export class InvalidInput extends Error {
  constructor(
    readonly code: string,
    message: string,
    readonly path: string,
  ) {
    super(message)
    this.name = 'InvalidInput'
  }
}
