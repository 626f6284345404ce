import { describe, expect, it } from 'vitest'
import { ProblemError } from '../../../errors'
import { seededRandom } from '../../../seeded-random'
import { rowsXml, workbookParts } from '../../../tables/testing/workbook'
import { zipOf, type ZipPart } from '../../../tables/testing/zip'
import { nothingRemembered } from './memory'
import { readNow } from './read'

type Random = () => number
const below = (random: Random, most: number) => Math.floor(random() * most)
const odd = [
  '<',
  '>',
  '&',
  '"',
  '\u0000',
  ';',
  ',',
  '\n',
  'A1',
  '-1',
  '1e999',
  '=',
  ']]>',
  '<!--',
  '_x0000_',
  '\ud800',
]

const parts = workbookParts({
  sheets: [
    {
      name: 'Data',
      rows: rowsXml([['Nr', 'Reading'], ...Array.from({ length: 20 }, (_e, at) => [at + 1, 24 + at / 1000])]),
    },
    {
      name: 'More',
      rows: '<row r="1"><c r="A1" t="s"><v>0</v></c><c r="B1" s="1"><f t="array" ref="B1:B2">A1</f><v>1.5</v></c></row>',
      state: 'hidden',
    },
  ],
  strings: ['<t>a_x0041_</t>'],
  formats: ['yyyy-mm-dd'],
})
const csv = `sep=;\nNr;"Reading ""mm""";Note\n${Array.from({ length: 30 }, (_e, at) => `${at + 1};24,${100 + at};ok`).join('\n')}\n`
const texts = [
  Buffer.from(csv),
  Buffer.from(csv, 'latin1'),
  Buffer.from(`\ufeff${csv}`, 'utf16le'),
  Buffer.from('1,24,001\n2,23,999\n3,24,002\n'),
]

/** Changes bytes: flips, removes, repeats, cuts off, or puts something in. */
function mutated(bytes: Buffer, random: Random): Buffer {
  const at = below(random, bytes.length)
  const length = 1 + below(random, 40)
  switch (below(random, 6)) {
    case 0:
      return bytes.subarray(0, at)
    case 1:
      return Buffer.concat([bytes.subarray(0, at), bytes.subarray(at + length)])
    case 2:
      return Buffer.concat([bytes.subarray(0, at + length), bytes.subarray(at)])
    case 3:
      return Buffer.concat([
        bytes.subarray(0, at),
        Buffer.from(odd[below(random, odd.length)] ?? ''),
        bytes.subarray(at),
      ])
    case 4: {
      const blown = Buffer.from(odd[below(random, odd.length)] ?? '')
        .toString()
        .repeat(2000)
      return Buffer.concat([bytes.subarray(0, at), Buffer.from(blown), bytes.subarray(at)])
    }
    default: {
      const flipped = Buffer.from(bytes)
      for (let index = 0; index < length; index++) flipped[below(random, bytes.length)] = below(random, 256)
      return flipped
    }
  }
}

/** A workbook of which one part is changed before it is packed, so that its sums are right. */
const mutatedInside = (random: Random): Buffer => {
  const chosen = below(random, parts.length)
  return zipOf(
    parts.map((part, at): ZipPart =>
      at === chosen ? { ...part, content: mutated(Buffer.from(part.content), random) } : part,
    ),
  )
}

function fileOf(seed: number): Buffer {
  const random = seededRandom(seed)
  const kind = seed % 3
  if (kind === 0) return mutated(zipOf(parts), random)
  if (kind === 1) return mutatedInside(random)
  return mutated(mutated(texts[below(random, texts.length)] ?? Buffer.alloc(0), random), random)
}

describe('mutated files', () => {
  it('are read or refused with a place and a mend, 900 of them, and never break anything', async () => {
    const outcomes = { read: 0, refused: 0 }
    for (let seed = 1; seed <= 900; seed++) {
      const file = { name: `mutant ${seed}`, bytes: fileOf(seed) }
      try {
        const read = await readNow({ source: 'uploaded' }, file, nothingRemembered)
        expect(
          read.readings.every(({ value, row }) => Number.isFinite(value) && row > 0),
          file.name,
        ).toBe(true)
        outcomes.read++
      } catch (error) {
        if (!(error instanceof ProblemError)) throw new Error(file.name, { cause: error })
        expect([error.status, error.errors?.[0]?.path], file.name).toEqual([422, 'body.file'])
        expect(error.errors?.[0]?.message.length, file.name).toBeGreaterThan(30)
        outcomes.refused++
      }
    }
    // Both happen often, so that the test shows something of each.
    expect(Math.min(outcomes.read, outcomes.refused)).toBeGreaterThan(200)
  }, 120_000)
})
