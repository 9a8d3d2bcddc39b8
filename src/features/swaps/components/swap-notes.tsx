import type { Ranking } from '#shared/contract/swap'

/** What the reader must know about the numbers before using them. */
export function SwapNotes({ estimated, minor }: Pick<Ranking, 'estimated' | 'minor'>) {
  if (!estimated && !minor) return null
  return (
    <ul className="mb-4 grid max-w-prose gap-1">
      {estimated && <li>Numbers are for an average adult until bests are logged.</li>}
      {minor && (
        <li>
          <strong>Under 18:</strong> the strength norms behind these numbers are not valid for minors. Load by feel,
          with a coach beside you.
        </li>
      )}
    </ul>
  )
}
