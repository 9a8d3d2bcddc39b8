/** One measured figure and the most it may be; without a limit it is printed for information only. */
export interface BenchResult {
  name: string
  /** A ratio, unless the name says another unit. */
  ratio: number
  atMost?: number
}

const over = ({ ratio, atMost }: BenchResult) => atMost !== undefined && !(ratio <= atMost)

/** Prints the closing table `name · ratio · at most` and tells whether every limit was kept. */
export function printTable(results: readonly BenchResult[]): boolean {
  const width = Math.max(...results.map(({ name }) => name.length))
  const line = (name: string, ratio: string, atMost: string) =>
    process.stdout.write(`${name.padEnd(width)} · ${ratio.padStart(7)} · ${atMost.padStart(7)}\n`)
  process.stdout.write('\n')
  line('name', 'ratio', 'at most')
  for (const result of results) {
    const limit = result.atMost === undefined ? '–' : `${result.atMost}${over(result) ? ' OVER' : ''}`
    line(result.name, result.ratio.toFixed(2), limit)
  }
  return !results.some(over)
}

export const median = (values: readonly number[]): number => {
  const sorted = [...values].sort((a, b) => a - b)
  const middle = Math.floor(sorted.length / 2)
  const upper = sorted[middle] ?? Number.NaN
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? upper) + upper) / 2
}
