import { useMemo, type ReactNode } from 'react'
import type { Ranking, SwapRow } from '#shared/contract/swap'
import { Button } from '@/components/ui/button'
import { columnsOf, DataTable, type Columns } from '@/components/ui/data-table'
import { LoadStrip } from '@/components/ui/load-strip'
import { supportWords } from '@/lib/exercise-words'
import { formatDoseLoad } from '@/lib/format'
import type { Units } from '@/lib/units'
import { capitalise, GUIDANCE_WORDS, jointWords, TARGET_WORDS } from '@/lib/words'
import { jointColumns, stressAt } from '../joints'
import type { LoadKind } from './types'

export interface SwapRowsProps {
  ranking: Ranking
  units: Units
  loadKind: (exerciseId: string) => LoadKind | undefined
  thumbnail: (row: SwapRow) => ReactNode
  detail: (row: SwapRow) => ReactNode
  /** Absent where nothing can be taken. */
  onTake?: (row: SwapRow) => void
  takingId?: string
}

const NBSP = '\u00a0'
/** “3 × 12”, “5 × 8 s” */
export const setsWords = ({ sets, repetitions, unit }: SwapRow['dose']): string =>
  `${sets}${NBSP}×${NBSP}${repetitions}${unit === 'seconds' ? `${NBSP}s` : ''}`

export const pathWords = ({ guidance, supports }: SwapRow['exercise']): string =>
  [GUIDANCE_WORDS[guidance], supportWords(supports)].filter((words) => words !== '').join(' · ')

const column = columnsOf<SwapRow>()

/** Desk form of the ranking: one row an exercise, every joint a strip. */
export function SwapTable({ ranking, units, loadKind, thumbnail, detail, onTake, takingId }: SwapRowsProps) {
  const columns = useMemo(
    (): Columns<SwapRow> =>
      column.columns([
        column.accessor((row) => row.exercise.name, {
          id: 'exercise',
          header: 'Exercise',
          sortFn: 'text',
          cell: ({ row: { original } }) => (
            <div className="flex w-56 items-center gap-2">
              {thumbnail(original)}
              <div className="min-w-0 leading-snug">
                <span className="text-pencil">{original.rank}</span>{' '}
                <span className="font-semibold">{original.exercise.name}</span>
                <span className="block text-pencil">{pathWords(original.exercise)}</span>
              </div>
            </div>
          ),
        }),
        column.accessor('targetDrive', {
          header: () => (
            <span>
              Target drive
              <span className="block font-normal">{TARGET_WORDS[ranking.target]}</span>
            </span>
          ),
          sortFn: 'basic',
          sortDescFirst: true,
          cell: ({ getValue }) => (
            <LoadStrip
              kind="drive"
              label={capitalise(TARGET_WORDS[ranking.target])}
              share={getValue()}
              className="min-w-24"
            />
          ),
        }),
        ...jointColumns(ranking).map((joint) =>
          column.accessor((row) => stressAt(row.joints, joint)?.stress ?? -1, {
            id: joint.key,
            header: joint.title,
            meta: { hot: joint.sore },
            sortFn: 'basic',
            sortDescFirst: false,
            cell: ({ row: { original } }) => {
              const stress = stressAt(original.joints, joint)
              if (stress === undefined) return <span className="text-pencil">none</span>
              return (
                <LoadStrip
                  label={capitalise(jointWords(stress.joint, stress.side))}
                  share={stress.stress}
                  cap={stress.cap}
                  className="min-w-22"
                />
              )
            },
          }),
        ),
        column.accessor('coordination', {
          header: 'Coordi\u00adnation',
          sortFn: 'basic',
          sortDescFirst: false,
          meta: { align: 'end' },
          cell: ({ getValue }) => Math.round(getValue()),
        }),
        column.accessor((row) => row.dose.load ?? 0, {
          id: 'dose',
          header: 'Dose',
          sortFn: 'basic',
          cell: ({ row: { original } }) => (
            <span className="whitespace-nowrap">
              <b>{setsWords(original.dose)}</b>
              <span className="block text-pencil">
                {formatDoseLoad(original.dose, units, loadKind(original.exercise.id)) ?? 'body weight'}
              </span>
            </span>
          ),
        }),
        column.accessor('score', {
          header: 'Score',
          sortFn: 'basic',
          sortDescFirst: true,
          meta: { align: 'end' },
          cell: ({ getValue }) => <span className="text-lg font-semibold">{Math.round(getValue())}</span>,
        }),
        ...(onTake === undefined
          ? []
          : [
              column.display({
                id: 'take',
                header: '',
                meta: { label: 'Take' },
                cell: ({ row: { original } }) => (
                  <Button
                    onClick={() => onTake(original)}
                    busy={takingId === original.exercise.id}
                    disabled={takingId !== undefined}
                    className="px-3"
                  >
                    Take<span className="sr-only"> {original.exercise.name}</span>
                  </Button>
                ),
              }),
            ]),
      ]),
    [ranking, units, loadKind, thumbnail, onTake, takingId],
  )
  return (
    <DataTable
      caption={`Swaps for ${ranking.original.name}`}
      columns={columns}
      rows={ranking.items}
      rowKey={(row) => row.exercise.id}
      rowName={(row) => row.exercise.name}
      detail={detail}
      sort={[{ id: 'score', desc: true }]}
      dense
    />
  )
}
