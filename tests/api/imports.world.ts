import { characteristics, imports, parts, type ImportState } from '@evenrule/api/contract'
import { startStory, type Story } from './prepared'

type Kind = imports.ImportKind
type People = Parameters<Story['by']>[0]

/** Rows as a CSV file; cells hold no separators here. */
export const csv = (...rows: readonly (readonly string[])[]) => ({
  name: 'rows.csv',
  bytes: Buffer.from(rows.map((row) => row.join(',')).join('\n')),
})

export type File = ReturnType<typeof csv>

/** A story with what imports need: previewing, applying, and waiting for the end. */
export async function startImports() {
  const story = await startStory()

  const preview = (who: People, kind: Kind, file: File, body: object = {}) =>
    story.by(who).call(imports.importsOf[kind].preview, {}, { body, file })

  /** Applies what was just previewed. */
  const begin = async (who: People, kind: Kind, file: File, more: object = {}) => {
    const { columns, headerRow } = more as { columns?: object; headerRow?: number }
    const { file: told, basis } = await preview(who, kind, file, { columns, headerRow })
    const body = { sha256: told.sha256, basis, mode: 'all', ...takenBy(kind), ...more }
    return story.by(who).call(imports.importsOf[kind].apply, {}, { body, file })
  }
  const takenBy = (kind: Kind) => (kind === 'studies' ? { takenBy: [story.people.engineer.id] } : {})

  const read = (who: People, importId: string) => story.by(who).call(imports.readImport, { importId })

  const end = async (who: People, importId: string, not: ImportState = 'applying') => {
    for (let tries = 0; tries < 600; tries += 1) {
      const now = await read(who, importId)
      if (now.state !== not) return now
      await new Promise((resolve) => setTimeout(resolve, 50))
    }
    throw new Error('The import does not end.')
  }
  const apply = async (who: People, kind: Kind, file: File, more: object = {}) =>
    end(who, (await begin(who, kind, file, more)).id)

  /** A refusal of applying what was just previewed. */
  const refusal = async (who: People, kind: Kind, file: File, more: object = {}) => {
    const { file: told, basis } = await preview(who, kind, file)
    const body = { sha256: told.sha256, basis, mode: 'all', ...takenBy(kind), ...more }
    return story.by(who).refusal(imports.importsOf[kind].apply, {}, { body, file })
  }

  const partsNow = async (who: People) =>
    (await story.by(who).call(parts.listParts, {}, { query: { size: 100 } })).items
  const characteristicsNow = async (who: People) =>
    (await story.by(who).call(characteristics.listCharacteristics, {}, { query: { size: 100 } })).items

  return { story, preview, begin, apply, refusal, end, read, partsNow, characteristicsNow }
}

export type Imports = Awaited<ReturnType<typeof startImports>>
