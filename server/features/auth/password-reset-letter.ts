import { publicUrl, type Env } from '../../env'
import { writeLetter } from '../../mail/letter'
import type { Letter } from '../../mail/mailer'
import { RESET_MINUTES } from './password-reset'

/** The token travels in the fragment, which browsers send to no server, so it stays out of every log. */
export const passwordResetLetter = (env: Env, to: { name: string; email: string }, token: string): Letter =>
  writeLetter({
    to: to.email,
    subject: 'Choose a new password',
    before: [`Hello ${to.name},`, 'Somebody, hopefully you, asked to set a new password for Pintle with this address.'],
    link: { label: 'Choose a new password', url: `${publicUrl(env)}/reset-password#token=${token}` },
    after: [
      `The link works once and for ${RESET_MINUTES} minutes. Setting the password signs you out everywhere.`,
      'If it was not you, do nothing: your password stays as it is.',
    ],
  })
