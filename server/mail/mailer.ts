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

/** Sends through the SMTP server of the environment. */
export function createMailer(env: Pick<Env, 'SMTP_URL' | 'MAIL_FROM'>): Mailer {
  const transport = createTransport(env.SMTP_URL, { from: env.MAIL_FROM })
  return {
    async send(letter) {
      await transport.sendMail(letter)
    },
    close: () => transport.close(),
  }
}
