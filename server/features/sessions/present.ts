import type { Session } from '#shared/contract/session'
import type { Affected } from '#shared/rules/index'
import type { SessionJson } from './repository'

export const presentSession = (
  session: SessionJson,
  about: { athleteId: string; day: string },
  affected: ReadonlyMap<string, Affected[]>,
  mayChange: boolean,
): Session => ({
  id: session.id,
  ...about,
  title: session.title,
  minutes: session.minutes,
  placeId: session.placeId,
  placeName: session.placeName,
  slots: session.slots.map(({ id, position, exercise, planned, intent, target, swap }) => ({
    id,
    position,
    exercise,
    planned,
    intent,
    target,
    swap: swap === null ? null : { ...swap, can: { undo: mayChange } },
    affected: affected.get(id) ?? [],
    // One swap stands at a time: the next is taken once this one is undone.
    can: { swap: mayChange && swap === null },
  })),
})
