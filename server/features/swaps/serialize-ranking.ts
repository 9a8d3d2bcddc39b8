import type { Ranking } from '#shared/contract/swap'

/** Rows that become text at once. */
const PIECE = 100

function* rowsJson(rows: readonly unknown[]): Generator<Buffer> {
  for (let at = 0; at < rows.length; at += PIECE) {
    const piece = rows.slice(at, at + PIECE).map((row) => JSON.stringify(row))
    yield Buffer.from((at === 0 ? '' : ',') + piece.join(','))
  }
}

/**
 * The ranking as JSON. Written piece by piece: as one text, the table of a long catalogue would take its size in memory
 * several times over before it became bytes.
 */
export function serializeRanking({ items, leftOut, ...about }: Ranking): Buffer {
  return Buffer.concat([
    Buffer.from(`${JSON.stringify(about).slice(0, -1)},"items":[`),
    ...rowsJson(items),
    Buffer.from('],"leftOut":['),
    ...rowsJson(leftOut),
    Buffer.from(']}'),
  ])
}
