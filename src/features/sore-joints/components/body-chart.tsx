import type { Joint, Side } from '#shared/mechanics/vocabulary'
import { cx } from '@/lib/cx'
import { capitalise, jointWords } from '@/lib/words'
import { BODY_PATH } from './body-outline'

export interface JointChoice {
  joint: Joint
  side: Side | null
}
type View = 'front' | 'back'

/** viewBox of one figure. */
const BOX = { left: -92, top: 2, width: 184, height: 404 }

/** Where the joints lie: distance from the midline, and height. */
const PAIRED: ReadonlyArray<[Joint, number, number]> = [
  ['shoulder', 43, 92],
  ['elbow', 61, 161],
  ['wrist', 75, 214],
  ['hip', 25, 228],
  ['knee', 30, 303],
  ['ankle', 30, 374],
]
const MIDLINE: ReadonlyArray<[Joint, number]> = [
  ['neck', 62],
  ['lowerBack', 180],
]

interface Spot extends JointChoice {
  x: number
  y: number
}

/** Seen from the front, the athlete’s right is on the viewer’s left. */
function spotsOf(view: View): Spot[] {
  const rightIs = view === 'front' ? -1 : 1
  const paired = PAIRED.flatMap(([joint, x, y]): Spot[] => [
    { joint, side: 'right', x: rightIs * x, y },
    { joint, side: 'left', x: -rightIs * x, y },
  ])
  return view === 'front' ? paired : [...MIDLINE.map(([joint, y]): Spot => ({ joint, side: null, x: 0, y })), ...paired]
}

const same = (choice: JointChoice | null, spot: JointChoice) =>
  choice !== null && choice.joint === spot.joint && choice.side === spot.side

interface BodyChartProps {
  chosen: JointChoice | null
  onChoose: (choice: JointChoice) => void
}

/** Front and back of the body; every joint is a button with its name. */
export function BodyChart({ chosen, onChoose }: BodyChartProps) {
  return (
    <div className="mx-auto grid max-w-lg grid-cols-2 gap-1 sm:gap-6">
      {(['front', 'back'] as const).map((view) => (
        <div key={view} role="group" aria-label={`Body from the ${view}`}>
          <div className="relative" style={{ aspectRatio: `${BOX.width} / ${BOX.height}` }}>
            <svg
              aria-hidden
              viewBox={`${BOX.left} ${BOX.top} ${BOX.width} ${BOX.height}`}
              className="absolute inset-0 size-full"
            >
              <g className="fill-body stroke-body-line" strokeWidth="1.2" strokeLinejoin="round">
                <path d={BODY_PATH} />
                <ellipse cx="0" cy="32" rx="17" ry="22" />
              </g>
              <Lines view={view} />
            </svg>
            {spotsOf(view).map((spot) => (
              <button
                key={`${spot.joint}-${spot.side}`}
                type="button"
                aria-pressed={same(chosen, spot)}
                onClick={() => onChoose({ joint: spot.joint, side: spot.side })}
                className="group absolute flex size-11 -translate-x-1/2 -translate-y-1/2 items-center justify-center rounded-full focus-visible:outline-offset-[-4px]"
                style={{
                  left: `${((spot.x - BOX.left) / BOX.width) * 100}%`,
                  top: `${((spot.y - BOX.top) / BOX.height) * 100}%`,
                }}
              >
                <span
                  aria-hidden
                  className={cx(
                    'size-5.5 rounded-full border-2 group-hover:scale-115',
                    same(chosen, spot) ? 'size-7 border-oxide bg-oxide' : 'border-slate bg-card',
                  )}
                />
                <span className="sr-only">{capitalise(jointWords(spot.joint, spot.side))}</span>
              </button>
            ))}
          </div>
          <p aria-hidden className="text-center text-pencil">
            {view}
          </p>
        </div>
      ))}
    </div>
  )
}

/** Collar bones in front; shoulder blades and spine behind: enough to tell the two views apart. */
function Lines({ view }: { view: View }) {
  return (
    <g className="stroke-body-line" fill="none" strokeWidth="1" strokeLinecap="round" opacity="0.7">
      {view === 'front' ? (
        <path d="M-32 87C-22 88 -11 88 -3 92M32 87C22 88 11 88 3 92" />
      ) : (
        <path d="M0 84V156M-25 100C-17 108 -15 122 -19 133M25 100C17 108 15 122 19 133" />
      )}
    </g>
  )
}
