import { createHash } from 'node:crypto'

/** A number in [0, 1) from a seed and a call count; the same seed gives the same row of numbers everywhere. */
export interface Random {
  /** Uniform in [0, 1). */
  share(): number
  /** Whole number from `least` to `most`, both included. */
  between(least: number, most: number): number
  pick<T>(from: readonly T[]): T
}

/** Mulberry32, a well-known 32-bit generator in the public domain, seeded from words. */
export function randomFrom(...words: string[]): Random {
  let state = createHash('sha256').update(words.join(' ')).digest().readUInt32LE(0)
  const share = () => {
    state = (state + 0x6d2b79f5) | 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32
  }
  return {
    share,
    between: (least, most) => least + Math.floor(share() * (most - least + 1)),
    pick: (from) => {
      const chosen = from[Math.floor(share() * from.length)]
      if (chosen === undefined) throw new Error('nothing to pick from')
      return chosen
    },
  }
}

/** A row id that depends on nothing but its name, so that seeding twice finds the same rows. */
export function demoId(...words: string[]): string {
  const hash = createHash('sha256')
    .update(`pintle demo ${words.join(' ')}`)
    .digest()
  hash.writeUInt8((hash.readUInt8(6) & 0x0f) | 0x50, 6)
  hash.writeUInt8((hash.readUInt8(8) & 0x3f) | 0x80, 8)
  const hex = hash.toString('hex', 0, 16)
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-')
}
