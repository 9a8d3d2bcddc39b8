import { execFile, spawn, type ChildProcess } from 'node:child_process'
import { createServer } from 'node:net'
import type { AddressInfo } from 'node:net'
import { promisify } from 'node:util'

const run = promisify(execFile)

export interface BuiltServer {
  url: string
  /** Where the mails that it sent can be read. */
  mailPageUrl: string
  process: ChildProcess
  /** Everything it wrote so far. */
  output(): string
  /** Asks it to stop and resolves to its exit code. */
  stop(): Promise<number | null>
}

/** A loopback port that was free a moment ago. */
export const freePort = (): Promise<number> =>
  new Promise((resolve, reject) => {
    const server = createServer().once('error', reject)
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as AddressInfo
      server.close(() => resolve(port))
    })
  })

const settings = (databaseUrl: string, port: number, mailPort: number) => ({
  ...process.env,
  NODE_ENV: 'production',
  HOST: '127.0.0.1',
  PORT: String(port),
  PUBLIC_URL: `http://127.0.0.1:${port}`,
  DATABASE_URL: databaseUrl,
  ACCESS_TOKEN_SECRET: 'q7Zt0bX4mWc9Lr2KfV6sNy1PdHj8GaEu',
  SMTP_URL: 'local',
  MAIL_PAGE_PORT: String(mailPort),
  PINTLE_DEMO: 'true',
  RATE_LIMIT_SCALE: '1000',
  LOG_LEVEL: 'warn',
})

async function untilReady(url: string, child: ChildProcess, output: () => string): Promise<void> {
  const deadline = Date.now() + 60_000
  while (Date.now() < deadline) {
    if (child.exitCode !== null) break
    const ok = await fetch(`${url}/api/health`).then(
      (response) => response.ok,
      () => false,
    )
    if (ok) return
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  throw new Error(`The built server did not become ready:\n${output()}`)
}

/** Migrates and seeds a database with the demo, then starts dist/server on it, as `npm start` does. */
export async function startBuiltServer(databaseUrl: string): Promise<BuiltServer> {
  const [port, mailPort] = [await freePort(), await freePort()]
  const env = settings(databaseUrl, port, mailPort)
  await run('node', ['--enable-source-maps', 'dist/server/seed.js'], { env })
  const heap = ['--max-semi-space-size=4', '--max-old-space-size=256']
  const child = spawn('node', [...heap, '--enable-source-maps', 'dist/server/main.js'], {
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let text = ''
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk: Buffer) => (text += chunk.toString()))
  const exited = new Promise<number | null>((resolve) => child.once('exit', resolve))
  const url = `http://127.0.0.1:${port}`
  const server: BuiltServer = {
    url,
    mailPageUrl: `http://127.0.0.1:${mailPort}/`,
    process: child,
    output: () => text,
    stop() {
      child.kill('SIGTERM')
      return exited
    },
  }
  try {
    await untilReady(url, child, server.output)
  } catch (error) {
    child.kill('SIGKILL')
    throw error
  }
  return server
}
