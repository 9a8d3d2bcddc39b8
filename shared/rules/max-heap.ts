/** A binary heap of indices, largest key on top. */
export class MaxHeap {
  private readonly keys: number[] = []
  private readonly values: number[] = []

  get size(): number {
    return this.keys.length
  }

  /** The largest key; −Infinity when empty. */
  get topKey(): number {
    return this.keys[0] ?? Number.NEGATIVE_INFINITY
  }

  push(key: number, value: number): void {
    const { keys, values } = this
    let at = keys.length
    keys.push(key)
    values.push(value)
    while (at > 0) {
      const parent = (at - 1) >> 1
      if (keys[parent]! >= key) break
      keys[at] = keys[parent]!
      values[at] = values[parent]!
      at = parent
    }
    keys[at] = key
    values[at] = value
  }

  /** Takes the value with the largest key off. */
  pop(): number {
    const { keys, values } = this
    const top = values[0]
    const key = keys.pop()
    const value = values.pop()
    if (top === undefined || key === undefined || value === undefined) throw new RangeError('The heap is empty.')
    if (keys.length === 0) return top
    let at = 0
    for (;;) {
      let child = 2 * at + 1
      if (child >= keys.length) break
      if (child + 1 < keys.length && keys[child + 1]! > keys[child]!) child++
      if (keys[child]! <= key) break
      keys[at] = keys[child]!
      values[at] = values[child]!
      at = child
    }
    keys[at] = key
    values[at] = value
    return top
  }
}
