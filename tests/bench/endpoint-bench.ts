import autocannon from 'autocannon'
import type { Me } from '#shared/contract/me'
import type { Today } from '#shared/contract/session'
import { call, signInTo } from './bench-server'
import { median, type BenchResult } from './result'

const CONNECTIONS = 32
const SECONDS = 6
const ROUNDS = 3

interface Latency {
  p50: number
  p99: number
}

/** Latency in ms over one run; autocannon's own histogram counts whole ms, so the samples are taken here. */
async function load(url: string, cookie: string, paths: readonly string[]): Promise<Latency> {
  const samples: number[] = []
  const { errors, timeouts, non2xx } = await new Promise<autocannon.Result>((resolve, reject) => {
    const running = autocannon(
      {
        url,
        connections: CONNECTIONS,
        duration: SECONDS,
        headers: { cookie },
        requests: paths.map((path) => ({ method: 'GET' as const, path })),
      },
      (error: Error | null, result) => (error === null ? resolve(result) : reject(error)),
    )
    running.on('response', (_client, _statusCode, _bytes, milliseconds) => samples.push(milliseconds))
  })
  if (errors + timeouts + non2xx > 0) {
    throw new Error(`${errors} errors, ${timeouts} time-outs and ${non2xx} refusals under load.`)
  }
  samples.sort((a, b) => a - b)
  const at = (share: number) => samples[Math.min(samples.length - 1, Math.floor(share * samples.length))] ?? Number.NaN
  return { p50: at(0.5), p99: at(0.99) }
}

/** The swap endpoint beside a bare one in the same server, in turns, as ratios of the medians over the rounds. */
export async function benchEndpoint(
  url: string,
  account: { email: string; password: string },
  day: string,
): Promise<BenchResult[]> {
  const cookie = await signInTo(url, account)
  const me = await call<Me>(url, cookie, '/api/me')
  await call(url, cookie, `/api/athletes/${me.id}/sore-joints`, {
    joint: 'elbow',
    side: 'right',
    rating: 4,
    provocations: ['bending'],
    redFlags: {
      injury: false,
      nerve: false,
      swollenOrFever: false,
      nightPain: false,
      severePain: false,
      chestOrBreath: false,
    },
    day,
  })
  const today = await call<Today>(url, cookie, `/api/athletes/${me.id}/today?day=${day}`)
  const slotIds = today.session?.slots.map(({ id }) => id) ?? []
  const swapPaths = slotIds.map((slotId) => `/api/slots/${slotId}/swaps`)
  const barePaths: string[] = []
  for (const [index, path] of swapPaths.entries()) {
    const body = await fetch(url + path, { headers: { cookie } })
    barePaths.push(`/api/bench/slots/${slotIds[index]}?bytes=${(await body.arrayBuffer()).byteLength}`)
  }
  // Every request a table nobody has read yet: the coordination filter, ever so slightly different, is another input.
  const freshPaths = Array.from({ length: 4000 }, (_, index) => `${swapPaths[1]}?maxCoordination=${100 - index / 1e6}`)

  await load(url, cookie, [...swapPaths, ...barePaths])
  const rounds: Array<{ bare: Latency; swap: Latency }> = []
  for (let round = 0; round < ROUNDS; round++) {
    const bare = await load(url, cookie, barePaths)
    const swap = await load(url, cookie, swapPaths)
    rounds.push({ bare, swap })
    process.stdout.write(
      `  round ${round + 1}: bare ${bare.p50.toFixed(2)} / ${bare.p99.toFixed(2)} ms, swaps ${swap.p50.toFixed(2)} / ${swap.p99.toFixed(2)} ms (p50 / p99)\n`,
    )
  }
  const fresh = await load(url, cookie, freshPaths)
  const bare50 = median(rounds.map(({ bare }) => bare.p50))
  return [
    {
      name: 'swap endpoint p50 ÷ bare endpoint p50, 32 connections',
      ratio: median(rounds.map(({ bare, swap }) => swap.p50 / bare.p50)),
      atMost: 2,
    },
    {
      name: 'swap endpoint p99 ÷ bare endpoint p99, 32 connections',
      ratio: median(rounds.map(({ bare, swap }) => swap.p99 / bare.p99)),
      atMost: 2,
    },
    { name: 'the same, p50, every table ranked anew (information)', ratio: fresh.p50 / bare50 },
  ]
}
