/** Why a backup was not made or not put back, in a line that says what to do. */
export class BackupProblem extends Error {
  override name = 'BackupProblem'
}
