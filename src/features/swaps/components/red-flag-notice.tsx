import type { ReactNode } from 'react'
import type { Ranking } from '#shared/contract/swap'
import { capitalise, jointWords, listWords } from '@/lib/words'

interface RedFlagNoticeProps {
  ranking: Pick<Ranking, 'redFlags' | 'items'>
  /** What to do now, in full. */
  advice: ReactNode
  /** The reader is the athlete. */
  own: boolean
}

/** A standing red flag ends the matter for its joint; what does not load it may still be offered. */
export function RedFlagNotice({ ranking: { redFlags, items }, advice, own }: RedFlagNoticeProps) {
  if (redFlags.length === 0) return null
  const joints = listWords(redFlags.map(({ joint, side }) => jointWords(joint, side)))
  return (
    <section aria-label="Red flag" className="mb-5 grid max-w-[88ch] gap-2">
      <p className="font-semibold">
        {capitalise(joints)}: red flag, so there are no swaps that load {redFlags.length === 1 ? 'it' : 'them'}.
      </p>
      {advice}
      <p>The care team {own ? 'you have' : 'the athlete has'} let in has been told.</p>
      {items.length > 0 && (
        <p className="text-pencil">
          What is listed below does not load {redFlags.length === 1 ? 'that joint' : 'those joints'}.
        </p>
      )}
    </section>
  )
}
