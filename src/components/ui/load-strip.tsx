import { useId } from 'react'
import { formatPercent } from '@/lib/format'
import { cx } from '@/lib/cx'

interface LoadStripProps {
  /** What it is about, for those who do not see the bar: “Right elbow”, “Lats”. */
  label: string
  /** Share of strength (load), or share of its own limit (drive); 1 is 100 %. */
  share: number
  /** The largest share allowed; a tick on the bar. */
  cap?: number | null
  /** load: oxide, what a joint is asked for. drive: lichen, how near its limit the wanted muscle gets. */
  kind?: 'load' | 'drive'
  className?: string
}

/** “Right elbow 31 % of strength, cap 50 %” */
export function loadStripText({ label, share, cap, kind = 'load' }: Omit<LoadStripProps, 'className'>): string {
  const reach = `${label} ${formatPercent(share)} of ${kind === 'load' ? 'strength' : 'its limit'}`
  return cap === null || cap === undefined ? reach : `${reach}, cap ${formatPercent(cap)}`
}

const percent = (share: number): string => `${Math.round(Math.min(1, Math.max(0, share)) * 1000) / 10}%`

/**
 * The load strip: 0 to 100 % of strength by length, the cap as a tick, the number with its unit at the end. Past the cap
 * the bar is hatched; past 100 % it ends and the number goes on. Drawn as SVG, so that it prints.
 */
export function LoadStrip({ label, share, cap = null, kind = 'load', className }: LoadStripProps) {
  const id = useId()
  const colour = kind === 'load' ? 'var(--oxide)' : 'var(--lichen)'
  const safe = cap === null ? share : Math.min(share, cap)
  const over = cap !== null && share > cap
  return (
    <div
      role="img"
      aria-label={loadStripText({ label, share, cap, kind })}
      className={cx('flex items-center gap-1.5', className)}
    >
      <svg aria-hidden className="block h-4 w-10 flex-auto overflow-visible">
        {over && (
          <defs>
            <pattern id={id} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
              <rect width="6" height="6" fill={colour} fillOpacity="0.25" />
              <rect width="3" height="6" fill={colour} />
            </pattern>
          </defs>
        )}
        <rect y="3" width="100%" height="10" rx="2" fill="var(--wash)" />
        <rect y="3" width={percent(safe)} height="10" rx="2" fill={colour} />
        {over && (
          <rect
            x={percent(cap)}
            y="3"
            width={percent(Math.min(1, share) - Math.min(1, cap))}
            height="10"
            fill={`url(#${id})`}
          />
        )}
        {cap !== null && (
          <rect x={percent(cap)} y="0" width="2" height="16" fill="var(--ink)" transform="translate(-1 0)" />
        )}
      </svg>
      <span aria-hidden className={cx('min-w-11 text-right whitespace-nowrap', over && 'font-semibold')}>
        {formatPercent(share)}
      </span>
    </div>
  )
}
