import type { Me, updateMe } from '#shared/contract/me'
import type { Received } from '#shared/contract/endpoint'
import type { Dependencies } from '../../dependencies'
import { AppError } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { clubsOf } from '../people/policy'
import { requireAthleteRole } from './policy'
import { presentMe } from './present'
import * as repository from './repository'

type Change = Received<typeof updateMe>['body']

const invalid = (path: string, message: string) =>
  new AppError('invalid_request', 'Some of what was sent cannot be used.', [{ path, message }])

export async function readMe({ dataSource, env }: Dependencies, userId: string): Promise<Me> {
  return presentMe(await repository.findSelf(dataSource.manager, userId), { demo: env.PINTLE_DEMO })
}

/** Changes what was given, or nothing at all. */
export async function changeMe(dependencies: Dependencies, actor: Actor, { body, ...rest }: Change): Promise<Me> {
  const { clock, dataSource } = dependencies
  const now = clock.now()
  if (body !== undefined) {
    requireAthleteRole(actor)
    const today = now.toISOString().slice(0, 10)
    if (body.birthDate > today || body.birthDate < '1900-01-01') {
      throw invalid('body.birthDate', 'Give the year of birth with four digits, not in the future.')
    }
  }
  await dataSource.transaction(async (manager) => {
    const { defaultPlaceId } = rest
    if (defaultPlaceId !== undefined && !(await repository.isPlaceOfClubs(manager, defaultPlaceId, clubsOf(actor)))) {
      throw invalid('defaultPlaceId', 'Choose a place of one of your clubs.')
    }
    await repository.updateSelf(manager, actor.userId, rest)
    if (body !== undefined) await repository.saveBody(manager, actor.userId, body, now)
    const changed = Object.keys(rest)
    if (changed.length > 0) {
      await recordAudit(manager, {
        actor,
        action: 'change.person',
        subject: actor.userId,
        details: { fields: changed.toSorted().join(', ') },
      })
    }
    if (body !== undefined) await recordAudit(manager, { actor, action: 'change.bodyProfile', subject: actor.userId })
  })
  return readMe(dependencies, actor.userId)
}
