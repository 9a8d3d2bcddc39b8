import { ChevronDown, ChevronUp } from 'lucide-react'
import { useId, useState, type ReactNode } from 'react'
import type { SwapRow } from '#shared/contract/swap'
import { Button } from '@/components/ui/button'
import { Card } from '@/components/ui/card'
import { Icon } from '@/components/ui/icon'
import { LoadStrip } from '@/components/ui/load-strip'
import { formatDoseLoad } from '@/lib/format'
import { capitalise, jointWords, TARGET_WORDS } from '@/lib/words'
import { jointColumns, stressAt, type JointColumn } from '../joints'
import { pathWords, setsWords, type SwapRowsProps } from './swap-table'

/** Phone form of the ranking: the same content as the table, one card an exercise. */
export function SwapCards({ ranking, units, loadKind, thumbnail, detail, onTake, takingId }: SwapRowsProps) {
  const joints = jointColumns(ranking)
  return (
    <ol aria-label={`Swaps for ${ranking.original.name}`} className="grid gap-3 md:grid-cols-2">
      {ranking.items.map((row) => (
        <li key={row.exercise.id}>
          <SwapCard
            row={row}
            joints={joints}
            target={TARGET_WORDS[ranking.target]}
            load={formatDoseLoad(row.dose, units, loadKind(row.exercise.id)) ?? 'body weight'}
            thumbnail={thumbnail(row)}
            detail={detail}
            onTake={onTake === undefined ? undefined : () => onTake(row)}
            taking={takingId === row.exercise.id}
            disabled={takingId !== undefined}
          />
        </li>
      ))}
    </ol>
  )
}

interface SwapCardProps {
  row: SwapRow
  joints: JointColumn[]
  target: string
  load: string
  thumbnail: ReactNode
  detail: (row: SwapRow) => ReactNode
  onTake?: () => void
  taking: boolean
  disabled: boolean
}

function SwapCard({ row, joints, target, load, thumbnail, detail, onTake, taking, disabled }: SwapCardProps) {
  const [open, setOpen] = useState(false)
  const id = useId()
  return (
    <Card className="p-3">
      <div className="flex gap-3">
        {thumbnail}
        <div className="min-w-0 flex-1">
          <h2 className="text-lg">
            <span className="font-normal text-pencil">{row.rank}</span> {row.exercise.name}
          </h2>
          <p className="leading-snug text-pencil">{pathWords(row.exercise)}</p>
          <p className="mt-1 font-semibold">
            {setsWords(row.dose)} · {load}
          </p>
        </div>
        <p className="text-right">
          <span className="text-xl font-semibold">{Math.round(row.score)}</span>
          <span className="sr-only"> points</span>
        </p>
      </div>
      <dl className="my-2 grid grid-cols-[7.5rem_1fr] items-center gap-x-2 gap-y-0.5">
        <dt className="text-pencil">{capitalise(target)} driven to</dt>
        <dd>
          <LoadStrip kind="drive" label={capitalise(target)} share={row.targetDrive} />
        </dd>
        {joints.map((joint) => {
          const stress = stressAt(row.joints, joint)
          return (
            <div key={joint.key} className="contents">
              <dt className={joint.sore ? 'font-semibold text-oxide' : 'text-pencil'}>{joint.title}</dt>
              <dd>
                {stress === undefined ? (
                  <span className="text-pencil">none</span>
                ) : (
                  <LoadStrip
                    label={capitalise(jointWords(stress.joint, stress.side))}
                    share={stress.stress}
                    cap={stress.cap}
                  />
                )}
              </dd>
            </div>
          )
        })}
        <dt className="text-pencil">Coordination</dt>
        <dd className="text-right">{Math.round(row.coordination)} of 100</dd>
      </dl>
      {open && (
        <div id={id} className="border-t border-rule">
          {detail(row)}
        </div>
      )}
      <div className="flex gap-2">
        {onTake !== undefined && !open && (
          <Button
            kind="primary"
            className="flex-1"
            onClick={onTake}
            busy={taking}
            disabled={disabled}
            busyLabel="Taking"
          >
            Take for today <span className="sr-only">{row.exercise.name}</span>
          </Button>
        )}
        <Button
          className={onTake === undefined || open ? 'flex-1' : ''}
          aria-expanded={open}
          aria-controls={open ? id : undefined}
          onClick={() => setOpen(!open)}
        >
          {open ? 'Less ' : 'More '}
          <span className="sr-only">about {row.exercise.name}</span>
          <Icon of={open ? ChevronUp : ChevronDown} />
        </Button>
      </div>
    </Card>
  )
}
