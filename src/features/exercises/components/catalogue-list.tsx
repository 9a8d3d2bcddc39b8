import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Link } from 'react-router-dom'
import type { Exercise } from '#shared/contract/exercise'
import { paths } from '@/app/paths'
import { Card } from '@/components/ui/card'
import { columnsOf, DataTable } from '@/components/ui/data-table'
import { MoreButton } from '@/components/ui/more-button'
import { EmptyState, Loaded, Skeleton } from '@/components/ui/states'
import { EQUIPMENT_WORDS, familyWords, MUSCLE_WORDS } from '@/lib/exercise-words'
import { itemsOf } from '@/lib/paged'
import { useWide } from '@/lib/use-wide'
import { capitalise, listWords } from '@/lib/words'
import { catalogueQuery } from '../api'
import { ExerciseThumbnail } from './exercise-figure'

/** Muscles named in the list; the exercise's own page has all of them. */
const NAMED = 3
const equipmentWords = ({ equipment }: Exercise): string =>
  equipment.length === 0 ? 'nothing' : listWords(equipment.map((kind) => EQUIPMENT_WORDS[kind]))
const muscleWords = ({ muscles }: Exercise): string =>
  muscles
    .slice(0, NAMED)
    .map(({ muscle }) => MUSCLE_WORDS[muscle])
    .join(', ')

const column = columnsOf<Exercise>()
const COLUMNS = column.columns([
  column.accessor('name', {
    header: 'Exercise',
    sortFn: 'text',
    cell: ({ row: { original } }) => (
      <div className="flex min-w-52 items-center gap-3">
        <ExerciseThumbnail exercise={original} className="h-16 w-14 shrink-0" />
        <Link to={paths.exercise(original.slug)} className="font-semibold link">
          {original.name}
        </Link>
      </div>
    ),
  }),
  column.accessor((exercise) => familyWords(exercise.family), { id: 'family', header: 'Family', sortFn: 'text' }),
  column.accessor(equipmentWords, { id: 'equipment', header: 'Equipment', sortFn: 'text' }),
  column.accessor(muscleWords, { id: 'muscles', header: 'Drives most', sortFn: 'text' }),
  column.accessor('coordination', {
    header: 'Coordination',
    sortFn: 'basic',
    sortDescFirst: false,
    meta: { align: 'end' },
    cell: ({ getValue }) => Math.round(getValue()),
  }),
])

/** Published exercises that match a search, as a table or, on narrow screens, as cards. */
export function CatalogueList({ search }: { search: string }) {
  const wide = useWide()
  const query = useInfiniteQuery(catalogueQuery(search))
  const { data } = query
  const rows = useMemo(() => (data === undefined ? [] : itemsOf(data)), [data])
  return (
    <Loaded query={query} what="exercises" skeleton={<Skeleton className="h-96 rounded-xl" />}>
      {() =>
        rows.length === 0 ? (
          <EmptyState title={search === '' ? 'The catalogue is empty.' : `No exercise is called “${search}”.`}>
            {search === ''
              ? 'Exercises appear here once they are published.'
              : 'Try a part of the name, such as “row” or “press”.'}
          </EmptyState>
        ) : (
          <div aria-busy={query.isPlaceholderData} className={query.isPlaceholderData ? 'opacity-60' : undefined}>
            {wide ? (
              <DataTable
                caption="Exercises"
                columns={COLUMNS}
                rows={rows}
                rowKey={({ id }) => id}
                sort={[{ id: 'name', desc: false }]}
              />
            ) : (
              <ul aria-label="Exercises" className="grid gap-3 sm:grid-cols-2">
                {rows.map((exercise) => (
                  <li key={exercise.id}>
                    <ExerciseCard exercise={exercise} />
                  </li>
                ))}
              </ul>
            )}
            <MoreButton query={query} />
          </div>
        )
      }
    </Loaded>
  )
}

function ExerciseCard({ exercise }: { exercise: Exercise }) {
  return (
    <Card className="relative flex gap-3 p-3">
      <ExerciseThumbnail exercise={exercise} className="h-20 w-16 shrink-0" />
      <div className="min-w-0 leading-snug">
        <h2 className="text-lg">
          <Link to={paths.exercise(exercise.slug)} className="link after:absolute after:inset-0">
            {exercise.name}
          </Link>
        </h2>
        <p className="text-pencil">
          {familyWords(exercise.family)} · {equipmentWords(exercise)}
        </p>
        <p>{capitalise(muscleWords(exercise))}</p>
        <p className="text-pencil">coordination {Math.round(exercise.coordination)} of 100</p>
      </div>
    </Card>
  )
}
