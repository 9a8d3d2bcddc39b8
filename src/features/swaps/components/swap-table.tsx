import { createContext, useContext, useMemo, type ReactNode } from 'react'
import type { Ranking, SwapRow } from '#shared/contract/swap'
import { Button } from '@/components/ui/button'
import { columnsOf, DataTable, type Columns } from '@/components/ui/data-table'
import { LoadStrip } from '@/components/ui/load-strip'
import { supportWords } from '@/lib/exercise-words'
import { formatDoseLoad } from '@/lib/format'
import type { Units } from '@/lib/units'
import { capitalise, GUIDANCE_WORDS, jointWords, TARGET_WORDS } from '@/lib/words'
import { jointColumns, stressAt, type JointColumn } from '../joints'
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

type CellContext = Pick<SwapRowsProps, 'units' | 'loadKind' | 'thumbnail' | 'onTake' | 'takingId'>
const CellContext = createContext<CellContext | null>(null)

/** What cells need beside their row. It comes by context, because a column made anew would mount its cells anew. */
function useCellContext(): CellContext {
  const context = useContext(CellContext)
  if (context === null) throw new Error('Cells of the swap table need the table around them.')
  return context
}

function ExerciseCell({ row }: { row: SwapRow }) {
  const { thumbnail } = useCellContext()
  return (
    <div className="flex w-52 items-center gap-2">
      {thumbnail(row)}
      <div className="min-w-0 leading-snug">
        <span className="text-pencil">{row.rank}</span> <span className="font-semibold">{row.exercise.name}</span>
        <span className="block text-pencil">{pathWords(row.exercise)}</span>
      </div>
    </div>
  )
}

function DoseCell({ row }: { row: SwapRow }) {
  const { units, loadKind } = useCellContext()
  return (
    <span className="block max-w-24 leading-snug">
      <b className="whitespace-nowrap">{setsWords(row.dose)}</b>
      <span className="block text-pencil">
        {formatDoseLoad(row.dose, units, loadKind(row.exercise.id)) ?? 'body weight'}
      </span>
    </span>
  )
}

function TakeCell({ row }: { row: SwapRow }) {
  const { onTake, takingId } = useCellContext()
  return (
    <Button
      onClick={() => onTake?.(row)}
      busy={takingId === row.exercise.id}
      disabled={takingId !== undefined}
      className="px-2.5"
    >
      Take <span className="sr-only">{row.exercise.name}</span>
    </Button>
  )
}

const column = columnsOf<SwapRow>()

const EXERCISE = column.accessor((row) => row.exercise.name, {
  id: 'exercise',
  header: 'Exercise',
  sortFn: 'text',
  cell: ({ row }) => <ExerciseCell row={row.original} />,
})
const COORDINATION = column.accessor('coordination', {
  header: 'Coordi\u00adnation',
  sortFn: 'basic',
  sortDescFirst: false,
  meta: { align: 'end' },
  cell: ({ getValue }) => Math.round(getValue()),
})
const DOSE = column.accessor((row) => row.dose.load ?? 0, {
  id: 'dose',
  header: 'Dose',
  sortFn: 'basic',
  cell: ({ row }) => <DoseCell row={row.original} />,
})
const SCORE = column.accessor('score', {
  header: 'Score',
  sortFn: 'basic',
  sortDescFirst: true,
  meta: { align: 'end' },
  cell: ({ getValue }) => <span className="text-lg font-semibold">{Math.round(getValue())}</span>,
})
const TAKE = column.display({
  id: 'take',
  header: '',
  meta: { label: 'Take' },
  cell: ({ row }) => <TakeCell row={row.original} />,
})

const driveColumn = (target: Ranking['target']) =>
  column.accessor('targetDrive', {
    header: () => (
      <span>
        Target drive <span className="block font-normal">{TARGET_WORDS[target]}</span>
      </span>
    ),
    sortFn: 'basic',
    sortDescFirst: true,
    cell: ({ getValue }) => (
      <LoadStrip kind="drive" label={capitalise(TARGET_WORDS[target])} share={getValue()} className="min-w-24" />
    ),
  })

const jointColumn = (joint: JointColumn) =>
  column.accessor((row) => stressAt(row.joints, joint)?.stress ?? -1, {
    id: joint.key,
    header: joint.title,
    meta: { hot: joint.sore },
    sortFn: 'basic',
    sortDescFirst: false,
    cell: ({ row }) => {
      const stress = stressAt(row.original.joints, joint)
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
  })

/** Desk form of the ranking: one row an exercise, every joint a strip. */
export function SwapTable({ ranking, detail, ...cells }: SwapRowsProps) {
  const { units, loadKind, thumbnail, onTake, takingId } = cells
  const canTake = onTake !== undefined
  const columns = useMemo(
    (): Columns<SwapRow> =>
      column.columns([
        EXERCISE,
        driveColumn(ranking.target),
        ...jointColumns(ranking).map(jointColumn),
        COORDINATION,
        DOSE,
        SCORE,
        ...(canTake ? [TAKE] : []),
      ]),
    [ranking, canTake],
  )
  const context = useMemo(
    () => ({ units, loadKind, thumbnail, onTake, takingId }),
    [units, loadKind, thumbnail, onTake, takingId],
  )
  return (
    <CellContext value={context}>
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
    </CellContext>
  )
}
