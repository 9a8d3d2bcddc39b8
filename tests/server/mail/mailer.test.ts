import type { AddressInfo } from 'node:net'
import { SMTPServer } from 'smtp-server'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { serializeError } from '#server/logger'
import { writeLetter } from '#server/mail/letter'
import { createMailer } from '#server/mail/mailer'

const ADDRESS = 'someone.private@example.test'

let smtp: SMTPServer
beforeEach(async () => {
  smtp = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    onRcptTo({ address }, _session, done) {
      done(Object.assign(new Error(`<${address}>: Recipient address rejected`), { responseCode: 550 }))
    },
  })
  await new Promise<void>((resolve) => smtp.listen(0, '127.0.0.1', resolve))
})
afterEach(() => new Promise<void>((resolve) => smtp.close(resolve)))

describe('a mail that is refused', () => {
  it('fails with the server’s code and without the address, which the server repeats', async () => {
    const { port } = smtp.server.address() as AddressInfo
    const mailer = createMailer({ SMTP_URL: `smtp://127.0.0.1:${port}`, MAIL_FROM: 'Pintle <no-reply@pintle.invalid>' })
    const letter = writeLetter({
      to: ADDRESS,
      subject: 'A subject',
      before: ['Hello,'],
      link: { label: 'Open it', url: 'https://pintle.example.test/x#token=abc' },
      after: [],
    })
    const failure: unknown = await mailer.send(letter).catch((error: unknown) => error)
    mailer.close()
    expect(failure).toBeInstanceOf(Error)
    const logged = JSON.stringify(serializeError(failure))
    expect(logged).not.toContain('someone.private')
    expect(logged).toContain('EENVELOPE')
    expect(logged).toContain('550')
  })
})
