import type { ReactNode } from 'react'
import type { SwapRow } from '#shared/contract/swap'
import { Button } from '@/components/ui/button'
import { FACTOR_WORDS, FACTORS } from '../words'

interface SwapDetailProps {
  row: SwapRow
  figure: ReactNode
  /** Absent where there is no slot to take it for, or the person may only read. */
  onTake?: () => void
  taking?: boolean
  takeLabel?: string
  onFlag?: () => void
}

/** Why a swap stands where it stands: figure, sentence, the factors of its score, and what can be done with it. */
export function SwapDetail({
  row,
  figure,
  onTake,
  taking = false,
  takeLabel = 'Take for today',
  onFlag,
}: SwapDetailProps) {
  return (
    <div className="flex flex-wrap gap-x-8 gap-y-4 py-2">
      <div className="min-w-0 flex-1 basis-80">{figure}</div>
      <div className="min-w-0 flex-1 basis-96">
        <p className="mb-3 max-w-prose">{row.reason}</p>
        <Factors row={row} />
        {(onTake !== undefined || onFlag !== undefined) && (
          <div className="mt-4 flex flex-wrap gap-3">
            {onTake !== undefined && (
              <Button kind="primary" onClick={onTake} busy={taking} busyLabel="Taking">
                {takeLabel}
              </Button>
            )}
            {onFlag !== undefined && (
              <Button kind="quiet" onClick={onFlag}>
                Flag this swap
              </Button>
            )}
          </div>
        )}
      </div>
    </div>
  )
}

/** The score is their product; each is shown by length, number and words. */
function Factors({ row }: { row: SwapRow }) {
  return (
    <table className="w-full">
      <caption className="pb-1 text-left text-pencil">How {Math.round(row.score)} comes about</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Factor</th>
          <th scope="col">Bar</th>
          <th scope="col">Value</th>
          <th scope="col">Why</th>
        </tr>
      </thead>
      <tbody>
        {FACTORS.map((name) => {
          const { value, note } = row.factors[name]
          return (
            <tr key={name} className="align-top">
              <th scope="row" className="pr-3 text-left font-normal whitespace-nowrap">
                {FACTOR_WORDS[name]}
              </th>
              <td className="w-24 pt-2 pr-3 max-sm:w-12" aria-hidden>
                <svg className="block h-2 w-full">
                  <rect width="100%" height="8" rx="2" fill="var(--wash)" stroke="var(--rule)" strokeWidth="0.5" />
                  <rect
                    width={`${Math.round(Math.min(1, Math.max(0, value)) * 1000) / 10}%`}
                    height="8"
                    rx="2"
                    fill="var(--lichen)"
                  />
                </svg>
              </td>
              <td className="pr-3 text-right">{value.toFixed(2)}</td>
              <td className="text-pencil">{note}</td>
            </tr>
          )
        })}
      </tbody>
    </table>
  )
}
