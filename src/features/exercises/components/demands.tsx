import type { JointStress, Preview } from '#shared/contract/exercise'
import { LoadStrip } from '@/components/ui/load-strip'
import { ACTION_WORDS, MUSCLE_WORDS } from '@/lib/exercise-words'
import { formatLoad } from '@/lib/format'
import type { Units } from '@/lib/units'
import { capitalise, jointWords } from '@/lib/words'

/** The occupational reference for compression at L5/S1 (NIOSH 1981, from memory), kN; a yardstick, not a limit. */
const COMPRESSION_REFERENCE = 3.4

/** Less than this rounds to 0 %. */
const TELLING = 0.005

/** The hardest each joint is asked for in any posture; joints that are asked for nothing are left out. */
export function hardestStress(preview: Pick<Preview, 'frames'>): JointStress[] {
  const hardest = new Map<string, JointStress>()
  for (const { joints } of preview.frames)
    for (const stress of joints) {
      const key = `${stress.joint}.${stress.side ?? ''}`
      if (stress.stress > (hardest.get(key)?.stress ?? -1)) hardest.set(key, stress)
    }
  return [...hardest.values()].filter(({ stress }) => stress >= TELLING).sort((a, b) => b.stress - a.stress)
}

export function JointDemands({ preview, units }: { preview: Preview; units: Units }) {
  const compression = Math.max(...preview.frames.map((frame) => frame.compression))
  return (
    <section aria-label="What it asks of the joints">
      <h2 className="mb-2 text-xl">What it asks</h2>
      <dl className="grid max-w-xl grid-cols-[9rem_1fr] items-center gap-x-3 gap-y-1">
        {hardestStress(preview).map((stress) => (
          <div key={`${stress.joint}.${stress.side}`} className="contents">
            <dt>{capitalise(jointWords(stress.joint, stress.side))}</dt>
            <dd>
              <LoadStrip
                label={capitalise(jointWords(stress.joint, stress.side))}
                share={stress.stress}
                cap={stress.cap}
              />
            </dd>
          </div>
        ))}
      </dl>
      <dl className="mt-3 grid max-w-xl grid-cols-[9rem_1fr] gap-x-3 gap-y-1">
        <dt>Gives out first</dt>
        <dd>{preview.limiter === null ? 'nothing within reach' : ACTION_WORDS[preview.limiter]}</dd>
        <dt>One repetition at most</dt>
        <dd>
          {preview.oneRepMax === null
            ? 'not set by the load'
            : preview.oneRepMax < 0
              ? `with ${formatLoad(preview.oneRepMax, units)} of assistance`
              : formatLoad(preview.oneRepMax, units)}
        </dd>
        <dt>Spine compression</dt>
        <dd>
          {compression.toFixed(1)} kN{' '}
          <span className="text-pencil">
            beside {COMPRESSION_REFERENCE} kN, the occupational reference, not a limit
          </span>
        </dd>
      </dl>
    </section>
  )
}

export function MusclesDriven({ muscles }: Pick<Preview, 'muscles'>) {
  return (
    <section aria-label="Muscles driven">
      <h2 className="mb-1 text-xl">Muscles driven</h2>
      <p className="mb-2 text-pencil">How near its own limit each muscle is at this load.</p>
      {muscles.length === 0 ? (
        <p>No muscle is driven far enough to list.</p>
      ) : (
        <dl className="grid max-w-xl grid-cols-[9rem_1fr] items-center gap-x-3 gap-y-1">
          {muscles.map(({ muscle, drive }) => (
            <div key={muscle} className="contents">
              <dt>{capitalise(MUSCLE_WORDS[muscle])}</dt>
              <dd>
                <LoadStrip kind="drive" label={capitalise(MUSCLE_WORDS[muscle])} share={drive} />
              </dd>
            </div>
          ))}
        </dl>
      )}
    </section>
  )
}

/** The numbers behind figure and strips, posture by posture. */
export function ActionTable({ preview }: { preview: Preview }) {
  return (
    <details className="mt-6">
      <summary className="min-h-target cursor-pointer py-2 font-semibold">Moments, posture by posture</summary>
      <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Moments, posture by posture">
        <table className="border-separate border-spacing-0">
          <thead>
            <tr>
              {['Posture', 'Action', 'Moment', 'Strength', 'Share'].map((title, index) => (
                <th
                  key={title}
                  scope="col"
                  className={index < 2 ? 'pr-6 text-left font-semibold' : 'pl-6 text-right font-semibold'}
                >
                  {title}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {preview.frames.flatMap(({ name, actions }) =>
              actions.map(({ action, moment, strength, demand }) => {
                const unit = isForce(action) ? 'N' : 'N·m'
                return (
                  <tr key={`${name}.${action}`}>
                    <th scope="row" className="border-t border-rule pr-6 text-left font-normal">
                      {name}
                    </th>
                    <td className="border-t border-rule pr-6">{ACTION_WORDS[action]}</td>
                    <td className="border-t border-rule pl-6 text-right whitespace-nowrap">
                      {Math.round(moment)} {unit}
                    </td>
                    <td className="border-t border-rule pl-6 text-right whitespace-nowrap">
                      {Math.round(strength)} {unit}
                    </td>
                    <td className="border-t border-rule pl-6 text-right whitespace-nowrap">
                      {Math.round(demand * 100)} %
                    </td>
                  </tr>
                )
              }),
            )}
          </tbody>
        </table>
      </div>
    </details>
  )
}

const isForce = (action: string): boolean => action === 'grip' || action.startsWith('scapular')
