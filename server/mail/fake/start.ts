import type { AddressInfo } from 'node:net'
import type { Server } from 'node:http'
import { simpleParser } from 'mailparser'
import { SMTPServer } from 'smtp-server'
import { Inbox } from './inbox'
import { createMailPage } from './page'

const LOOPBACK = '127.0.0.1'
const LARGEST_MAIL = 1024 * 1024

export interface MailFake {
  inbox: Inbox
  smtpUrl: string
  pageUrl: string
  stop(): Promise<void>
}

function createSmtpServer(inbox: Inbox): SMTPServer {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: LARGEST_MAIL,
    onData(stream, _session, done) {
      simpleParser(stream).then((mail) => {
        const to = [mail.to ?? []].flat().map(({ text }) => text)
        inbox.add({
          receivedAt: new Date(),
          to: to.join(', '),
          subject: mail.subject ?? '(no subject)',
          text: mail.text ?? '',
          html: mail.html || '',
        })
        done()
      }, done)
    },
  })
}

const listen = (
  server: {
    listen(port: number, host: string, done: () => void): unknown
    once(event: 'error', fail: (error: Error) => void): unknown
  },
  port: number,
) =>
  new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, LOOPBACK, resolve)
  })

/** A mail server for machines without one: takes every mail, delivers none, and shows them on a loopback page. */
export async function startMailFake({ pagePort = 0 }: { pagePort?: number } = {}): Promise<MailFake> {
  const inbox = new Inbox()
  const smtp = createSmtpServer(inbox)
  const page: Server = createMailPage(inbox)
  await listen(smtp.server, 0)
  await listen(page, pagePort)
  const port = (server: { address(): AddressInfo | string | null }) => (server.address() as AddressInfo).port
  return {
    inbox,
    smtpUrl: `smtp://${LOOPBACK}:${port(smtp.server)}`,
    pageUrl: `http://${LOOPBACK}:${port(page)}/`,
    async stop() {
      page.closeAllConnections()
      await Promise.all([
        new Promise<void>((resolve) => page.close(() => resolve())),
        new Promise<void>((resolve) => smtp.close(resolve)),
      ])
    },
  }
}
