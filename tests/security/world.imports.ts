import { imports } from '@evenrule/api/contract'
import type { Story } from '../api/prepared'

/** An import of one new part, so that there is a row of it for each side; waits until it is applied. */
export async function importRow(story: Story, who: 'engineer' | 'quality'): Promise<string> {
  const by = story.by(who)
  const { supplier, customer } = story.organisations
  const [heading, partner] = who === 'engineer' ? ['Customer', customer.name] : ['Supplier', supplier.name]
  const file = {
    name: 'parts.csv',
    bytes: Buffer.from(`${heading},Part number,Part name,Revision\n${partner},I-${who},Imported,A\n`),
  }
  const seen = await by.call(imports.importsOf.parts.preview, {}, { body: {}, file })
  const { id } = await by.call(
    imports.importsOf.parts.apply,
    {},
    { body: { sha256: seen.file.sha256, basis: seen.basis, mode: 'all' }, file },
  )
  for (;;) {
    const { state, failure } = await by.call(imports.readImport, { importId: id })
    if (state === 'applied') return id
    if (state !== 'applying') throw new Error(`The import ended as ${state}: ${JSON.stringify(failure)}`)
    await new Promise((resolve) => setTimeout(resolve, 50))
  }
}
