import { OpenApiGeneratorV31, OpenAPIRegistry, type RouteConfig } from '@asteasolutions/zod-to-openapi'
import { Router } from 'express'
import { z } from 'zod'
import { errorBody } from '#shared/contract/common'
import type { Endpoint } from '#shared/contract/endpoint'
import { ENDPOINTS } from '#shared/contract/index'

const JSON_TYPE = 'application/json'
const ERROR = { $ref: '#/components/schemas/Error' }

function toRoute(feature: string, name: string, endpoint: Endpoint): RouteConfig {
  const status = endpoint.status ?? (endpoint.response === undefined ? 204 : 200)
  const description = endpoint.response === undefined ? 'Done; no body.' : 'Done.'
  return {
    method: endpoint.method.toLowerCase() as RouteConfig['method'],
    path: endpoint.path.replace(/:([A-Za-z]+)/g, '{$1}'),
    operationId: name,
    tags: [feature],
    summary: endpoint.summary,
    security: endpoint.access === 'public' ? [] : [{ accessCookie: [] }],
    request: {
      ...(endpoint.params && { params: endpoint.params as z.ZodObject }),
      ...(endpoint.query && { query: endpoint.query as z.ZodObject }),
      ...(endpoint.body && { body: { required: true, content: { [JSON_TYPE]: { schema: endpoint.body } } } }),
    },
    responses: {
      [status]:
        endpoint.response === undefined
          ? { description }
          : { description, content: { [JSON_TYPE]: { schema: endpoint.response } } },
      default: {
        description: 'Refused or failed; `error.code` says why.',
        content: { [JSON_TYPE]: { schema: ERROR } },
      },
    },
  }
}

/** The OpenAPI 3.1 document of the whole API, made from the contract. */
export function createOpenApiDocument() {
  const registry = new OpenAPIRegistry()
  const { $schema: _dialect, ...error } = z.toJSONSchema(errorBody)
  registry.registerComponent('schemas', 'Error', error as Parameters<typeof registry.registerComponent<'schemas'>>[2])
  registry.registerComponent('securitySchemes', 'accessCookie', { type: 'apiKey', in: 'cookie', name: 'pintle_access' })
  for (const { feature, name, endpoint } of ENDPOINTS) registry.registerPath(toRoute(feature, name, endpoint))
  return new OpenApiGeneratorV31(registry.definitions).generateDocument({
    openapi: '3.1.0',
    info: {
      title: 'Pintle',
      version: '1',
      description: 'Joint-load aware exercise swaps. Training information, not a diagnosis and not medical advice.',
    },
    servers: [{ url: '/' }],
  })
}

export function openApiRoutes(): Router {
  const router = Router()
  let document: string | null = null
  router.get('/api/openapi.json', (_request, response) => {
    document ??= JSON.stringify(createOpenApiDocument())
    response.type('json').send(document)
  })
  return router
}
