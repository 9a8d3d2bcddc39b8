import type { AddressInfo } from 'node:net'
import type { Server } from 'node:http'
import type { Express } from 'express'
import { createApp } from './app'
import { createDependencies, type Dependencies } from './dependencies'
import { parseEnv, publicUrl, type Env } from './env'
import { explain } from './errors'
import { demoAccounts } from './features/auth/demo-accounts'
import type { MailFake } from './mail/fake/start'

/** How long requests that are under way may take once the server was told to stop. */
const STOP_SECONDS = 10

const tell = (line: string) => process.stdout.write(`${line}\n`)

const listen = (app: Express, env: Env): Promise<Server> =>
  new Promise((resolve, reject) => {
    const server = app.listen(env.PORT, env.HOST, (error) => (error === undefined ? resolve(server) : reject(error)))
  })

/** The fake needs packages that a deployment with real mail does not install. */
async function startLocalMail(env: Env): Promise<MailFake | null> {
  if (env.SMTP_URL !== 'local') return null
  const { startMailFake } = await import('./mail/fake/start')
  return startMailFake({ pagePort: env.MAIL_PAGE_PORT })
}

/** One line per demo person, with the clubs they are in. */
function accountLines(env: Env): string[] {
  const accounts = demoAccounts(env)
  const people = accounts.filter(({ email }, index) => accounts.findIndex((other) => other.email === email) === index)
  const lines = people.map(({ name, email, password, role }) => {
    const clubs = accounts.filter((other) => other.email === email).map(({ clubName }) => clubName)
    return `  ${role.padEnd(8)} ${email.padEnd(32)} ${password.padEnd(24)} ${name}, ${clubs.join(' and ')}`
  })
  return lines.length === 0 ? [] : ['Demo accounts (invented people):', ...lines]
}

async function stop(server: Server, { background, dataSource, logger, mailer }: Dependencies, mail: MailFake | null) {
  logger.info('stopping')
  const closed = new Promise<void>((resolve) => server.close(() => resolve()))
  const timer = setTimeout(() => server.closeAllConnections(), STOP_SECONDS * 1000)
  server.closeIdleConnections()
  await closed
  clearTimeout(timer)
  await background.settled()
  mailer.close()
  await mail?.stop()
  await dataSource.destroy()
}

async function main(): Promise<void> {
  const given = parseEnv(process.env)
  const mail = await startLocalMail(given)
  const env: Env = mail === null ? given : { ...given, SMTP_URL: mail.smtpUrl }
  const dependencies = await createDependencies(env)
  const server = await listen(createApp(dependencies), env)
  let stopping = false
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.on(signal, () => {
      // The second signal, from somebody who does not want to wait, ends it at once.
      if (stopping) process.exit(1)
      stopping = true
      stop(server, dependencies, mail).then(
        () => process.exit(0),
        (error: unknown) => {
          dependencies.logger.error({ err: error }, 'did not stop cleanly')
          process.exit(1)
        },
      )
    })
  }
  const { port } = server.address() as AddressInfo
  dependencies.logger.info({ port }, 'listening')
  for (const line of accountLines(env)) tell(line)
  if (mail !== null) tell(`Mails are not delivered but kept; read them at ${mail.pageUrl}`)
  tell(`Pintle is ready at ${publicUrl(env)}`)
}

main().catch((error: unknown) => {
  process.stderr.write(`${explain(error)}\n`)
  process.exit(1)
})
