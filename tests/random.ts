/** A seeded stream of random numbers (Mulberry32): the same inputs in every run, named by their place. */
export class Random {
  constructor(private state: number) {}

  /** At least 0, below 1. */
  next(): number {
    this.state = (this.state + 0x6d2b79f5) | 0
    let t = Math.imul(this.state ^ (this.state >>> 15), 1 | this.state)
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296
  }

  between(low: number, high: number): number {
    return low + (high - low) * this.next()
  }

  whole(low: number, high: number): number {
    return Math.floor(this.between(low, high + 1))
  }

  /** Evenly spread over the orders of magnitude between two sizes above zero. */
  size(low: number, high: number): number {
    return Math.exp(this.between(Math.log(low), Math.log(high)))
  }

  of<T>(choices: readonly T[]): T {
    return choices[this.whole(0, choices.length - 1)] as T
  }

  chance(share: number): boolean {
    return this.next() < share
  }

  normal(): number {
    return Math.sqrt(-2 * Math.log(1 - this.next())) * Math.cos(2 * Math.PI * this.next())
  }
}
