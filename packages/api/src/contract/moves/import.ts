/** How an import stands. That its program stopped is derived from its last sign of life, never stored. */
export const importStates = ['applying', 'applied', 'failed', 'interrupted'] as const
export type ImportState = (typeof importStates)[number]
export type StoredImportState = Exclude<ImportState, 'interrupted'>

/** A running import tells this often that it lives, and counts as interrupted after so long a silence; milliseconds. */
export const aliveEvery = 3_000
export const silentAfter = 20_000

/**
 * The moves of an import. All it brings in is one transaction, so one that failed or was interrupted changed nothing
 * and can be repeated as it was; one that was applied stays.
 */
export const importMoves = [
  { name: 'begin', from: [], to: 'applying', words: 'Import' },
  { name: 'apply', from: ['applying'], to: 'applied', words: 'Applied' },
  { name: 'fail', from: ['applying'], to: 'failed', words: 'Failed' },
  { name: 'repeat', from: ['failed', 'interrupted'], to: 'applying', words: 'Import it again' },
] as const satisfies readonly {
  name: string
  from: readonly ImportState[]
  to: StoredImportState
  words: string
}[]

/** Whether an import that stands so may make the move. */
export const mayMoveImport = (name: (typeof importMoves)[number]['name'], state: ImportState): boolean =>
  importMoves.some((move) => move.name === name && (move.from as readonly ImportState[]).includes(state))
