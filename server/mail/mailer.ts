import { createTransport } from 'nodemailer'
import type { Env } from '../env'

/** A letter in both forms. Mails travel in the open: they say nothing of health. */
export interface Letter {
  to: string
  subject: string
  text: string
  html: string
}

export interface Mailer {
  send(letter: Letter): Promise<void>
  close(): void
}

/** What may be said of a mail that did not go out: servers repeat the address in their sentences, so only codes are kept. */
function sendFailure(error: unknown): Error {
  const { code, command, responseCode } = error as { code?: string; command?: string; responseCode?: number }
  const about = [code, command, responseCode].filter((part) => part !== undefined).join(', ')
  return Object.assign(new Error(`The mail could not be sent${about === '' ? '' : ` (${about})`}.`), { code })
}

/** Sends through the SMTP server of the environment. */
export function createMailer(env: Pick<Env, 'SMTP_URL' | 'MAIL_FROM'>): Mailer {
  const transport = createTransport(env.SMTP_URL, { from: env.MAIL_FROM })
  return {
    async send(letter) {
      try {
        await transport.sendMail(letter)
      } catch (error) {
        throw sendFailure(error)
      }
    },
    close: () => transport.close(),
  }
}
