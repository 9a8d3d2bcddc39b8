/**
 * The production app in a process of its own, with one bare endpoint beside it: the same authentication, one indexed
 * select, and a body of the size asked for. Talks to its parent over IPC.
 */
import type { AddressInfo } from 'node:net'
import { Router } from 'express'
import { z } from 'zod'
import { id } from '#shared/contract/common'
import { endpoint } from '#shared/contract/endpoint'
import { createApp } from '#server/app'
import { createDependencies, type Dependencies } from '#server/dependencies'
import { parseEnv } from '#server/env'
import { mount, Serialized } from '#server/middleware/mount'

const bare = endpoint({
  method: 'GET',
  path: '/api/bench/slots/:slotId',
  summary: 'One indexed select and a body of the asked size.',
  access: 'signedIn',
  params: z.object({ slotId: id }),
  query: z.object({ bytes: z.coerce.number().int().min(20).max(10_000_000) }),
  response: z.object({ padding: z.string() }),
})

function bareRoutes({ dataSource }: Dependencies): Router {
  const bodies = new Map<number, Buffer>()
  const router = Router()
  mount(router, bare, async ({ params, query }) => {
    await dataSource.query('select id, session_id, exercise_id, position from slots where id = $1', [params.slotId])
    let body = bodies.get(query.bytes)
    if (body === undefined) {
      body = Buffer.from(JSON.stringify({ padding: 'x'.repeat(query.bytes - '{"padding":""}'.length) }))
      bodies.set(query.bytes, body)
    }
    return new Serialized(body)
  })
  return router
}

const dependencies = await createDependencies(parseEnv(process.env))
const server = createApp(dependencies, [bareRoutes]).listen(0, '127.0.0.1', () => {
  process.send?.({ port: (server.address() as AddressInfo).port })
})
process.on('disconnect', () => process.exit(0))
