import express, { Router, type Express } from 'express'
import { pino } from 'pino'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { endpoint } from '#shared/contract/endpoint'
import { errorHandler } from '#server/middleware/error-handler'
import { mount, mountPublic } from '#server/middleware/mount'
import { setScope, type Actor } from '#server/middleware/scope'

const someone: Actor = { userId: 'u', name: 'N', memberships: [] }

const echo = endpoint({
  method: 'POST',
  path: '/api/echo/:id',
  summary: '',
  access: 'public',
  params: z.object({ id: z.uuid() }),
  query: z.object({ count: z.coerce.number().default(3) }),
  body: z.strictObject({ text: z.string() }),
  response: z.object({ text: z.string(), count: z.number() }),
  status: 201,
})
const whoAmI = endpoint({
  method: 'GET',
  path: '/api/who',
  summary: '',
  access: 'signedIn',
  response: z.object({ name: z.string() }),
})
const nothing = endpoint({ method: 'DELETE', path: '/api/nothing', summary: '', access: 'public' })

function serve(routes: (router: Router) => void, checkAnswers = true): Express {
  const app = express()
  const logger = pino({ level: 'silent' })
  app.use(express.json(), (_request, response, next) => {
    setScope(response, { requestId: 'r', logger, loadActor: () => Promise.resolve(someone), checkAnswers })
    next()
  })
  const router = Router()
  routes(router)
  app.use(router, errorHandler(logger))
  return app
}

const ID = '0b5c1f2e-7a51-4f0e-9d9c-8f1d6f0a1b2c'

describe('a mounted endpoint', () => {
  it('gives its handler what the schemas made of the request, and sends its status', async () => {
    const app = serve((router) =>
      mountPublic(router, echo, [], ({ body, query, actor }) => {
        expect(actor).toBeNull()
        return { text: body.text, count: query.count }
      }),
    )
    const response = await request(app).post(`/api/echo/${ID}`).send({ text: 'hello' })
    expect({ status: response.status, body: response.body }).toEqual({ status: 201, body: { text: 'hello', count: 3 } })
  })

  it('names a field that its schema does not know', async () => {
    const app = serve((router) => mountPublic(router, echo, [], ({ body }) => ({ text: body.text, count: 1 })))
    const response = await request(app).post(`/api/echo/${ID}`).send({ text: 'x', more: 1, most: 2 })
    expect(response.body.error.fields.map(({ path }: { path: string }) => path)).toEqual(['more', 'most'])
  })

  it('knows who asks', async () => {
    const app = serve((router) => mount(router, whoAmI, ({ actor }) => ({ name: actor.name })))
    expect((await request(app).get('/api/who')).body).toEqual({ name: 'N' })
  })

  it('answers 204 when the contract has no response', async () => {
    const app = serve((router) => mountPublic(router, nothing, [], () => undefined))
    const response = await request(app).delete('/api/nothing')
    expect({ status: response.status, text: response.text }).toEqual({ status: 204, text: '' })
  })

  it.each([
    ['lacks a field', {}],
    ['has a field of the wrong type', { name: 1 }],
    ['has a field too many', { name: 'N', passwordHash: 'x' }],
  ])('fails when its answer %s, unless answers are not checked', async (_what, answer) => {
    const routes = (router: Router) => mount(router, whoAmI, () => answer as { name: string })
    expect((await request(serve(routes)).get('/api/who')).body.error.code).toBe('internal')
    expect((await request(serve(routes, false)).get('/api/who')).status).toBe(200)
  })

  it('cannot be mounted with the wrong access', () => {
    expect(() => serve((router) => mount(router, echo, () => ({ text: '', count: 1 })))).toThrow('mountPublic')
    expect(() => serve((router) => mountPublic(router, whoAmI, [], () => ({ name: '' })))).toThrow('mount')
  })
})
