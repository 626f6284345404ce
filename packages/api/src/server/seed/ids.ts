export type Thing = 'part' | 'revision' | 'characteristic' | 'gauge' | 'standard' | 'task' | 'house terms'

/** Ids that the scenes played so far have brought about, by what people call the things. */
export class Ids {
  readonly #ids = new Map<string, string>()

  set(thing: Thing, name: string, id: string): void {
    this.#ids.set(`${thing} ${name}`, id)
  }

  /** The id of a thing that an earlier scene has brought about. */
  get(thing: Thing, name: string): string {
    const id = this.#ids.get(`${thing} ${name}`)
    if (!id) throw new Error(`The demonstration has no ${thing} ${name} yet.`)
    return id
  }
}

export const characteristicName = (partNumber: string, number: number): string => `${partNumber}/${number}`

export const taskName = (partNumber: string, number: number, gaugeCode: string): string =>
  `${characteristicName(partNumber, number)}/${gaugeCode}`

export const houseTermsName = (customer: string, number: number): string => `${customer} ${number}`
