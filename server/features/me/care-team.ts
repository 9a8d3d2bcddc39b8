import type { z } from 'zod'
import type { careTeamMember } from '#shared/contract/athlete'
import type { Dependencies } from '../../dependencies'
import { notFound } from '../../errors'
import type { Actor } from '../../middleware/scope'
import { recordAudit } from '../audit/record'
import { requireAthleteRole } from './policy'
import { presentCarer } from './present'
import * as repository from './repository'

type CareTeamMember = z.infer<typeof careTeamMember>

export async function listCareTeam({ dataSource }: Dependencies, actor: Actor): Promise<CareTeamMember[]> {
  requireAthleteRole(actor)
  return (await repository.findCareTeam(dataSource.manager, actor.userId)).map(presentCarer)
}

/** Lets a coach or physio in, or shuts them out at once; saying the same twice changes nothing. */
export async function changeConsent(
  { clock, dataSource }: Dependencies,
  actor: Actor,
  carerId: string,
  letIn: boolean,
): Promise<CareTeamMember> {
  requireAthleteRole(actor)
  return dataSource.transaction(async (manager) => {
    const find = async () => (await repository.findCareTeam(manager, actor.userId, carerId))[0]
    if ((await find()) === undefined) throw notFound('That coach or physio')
    const write = letIn ? repository.grantConsent : repository.revokeConsent
    if (await write(manager, actor.userId, carerId, clock.now())) {
      const action = letIn ? 'grant.consent' : 'revoke.consent'
      await recordAudit(manager, { actor, action, subject: actor.userId, details: { carerId } })
    }
    const after = await find()
    if (after === undefined) throw notFound('That coach or physio')
    return presentCarer(after)
  })
}
