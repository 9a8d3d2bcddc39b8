import type { Dependencies } from '../../dependencies'
import { publicUrl } from '../../env'
import { findCareTeamAddresses } from './repository'

const SENTENCE = 'An athlete you look after has reported something that needs your attention. Sign in to see it.'

/**
 * Tells everybody the athlete lets in. Mails travel in the open, so this one names neither the athlete nor the joint.
 * One address that fails does not keep the others from being told.
 */
export async function tellCareTeam({ dataSource, mailer, env }: Dependencies, athleteId: string): Promise<void> {
  const team = await findCareTeamAddresses(dataSource.manager, athleteId)
  const link = publicUrl(env)
  const sent = await Promise.allSettled(
    team.map(({ email }) =>
      mailer.send({
        to: email,
        subject: 'Pintle: something needs your attention',
        text: `${SENTENCE}\n\n${link}\n`,
        html: `<p>${SENTENCE}</p><p><a href="${link}">${link}</a></p>`,
      }),
    ),
  )
  const failed = sent.filter((result) => result.status === 'rejected').length
  if (failed > 0) throw new Error(`${failed} of ${sent.length} notices could not be sent`)
}
