import { describe, expect, it } from 'vitest'
import { ENDPOINTS } from '#shared/contract/index'
import { testApp } from '#tests/support/test-app'

interface Operation {
  operationId: string
  responses: Record<string, unknown>
  security: unknown[]
  parameters?: Array<{ name: string; in: string }>
}
interface Document {
  openapi: string
  paths: Record<string, Record<string, Operation>>
}

/** Every `$ref` in a document. */
function references(value: unknown): string[] {
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]) => (key === '$ref' ? [String(inner)] : references(inner)))
}

/** What a local reference points at. */
const resolve = (document: object, reference: string): unknown =>
  reference
    .replace(/^#\//, '')
    .split('/')
    .reduce<unknown>(
      (value, part) =>
        (value as Record<string, unknown> | undefined)?.[part.replaceAll('~1', '/').replaceAll('~0', '~')],
      document,
    )

describe('the OpenAPI document', () => {
  const app = testApp()
  const read = async () => (await app().anonymous().get('/api/openapi.json').expect(200)).body as Document

  it('is OpenAPI 3.1 and open to everybody', async () => {
    expect((await read()).openapi).toBe('3.1.0')
  })

  it('lists every endpoint of the contract with its success and nothing else', async () => {
    const { paths } = await read()
    const listed = Object.entries(paths).flatMap(([path, operations]) =>
      Object.entries(operations).map(
        ([method, { responses }]) => `${method} ${path} ${Object.keys(responses).join(' ')}`,
      ),
    )
    const wanted = ENDPOINTS.map(({ endpoint }) => {
      const status = endpoint.status ?? (endpoint.response === undefined ? 204 : 200)
      return `${endpoint.method.toLowerCase()} ${endpoint.path.replace(/:(\w+)/g, '{$1}')} ${status} default`
    })
    expect(listed.toSorted()).toEqual(wanted.toSorted())
  })

  it('names each parameter of a path and says who may call', async () => {
    const { paths } = await read()
    for (const { name, endpoint } of ENDPOINTS) {
      const path = endpoint.path.replace(/:(\w+)/g, '{$1}')
      const operation = paths[path]?.[endpoint.method.toLowerCase()]
      const inPath = (operation?.parameters ?? [])
        .filter((parameter) => parameter.in === 'path')
        .map((parameter) => parameter.name)
      expect(inPath, path).toEqual([...endpoint.path.matchAll(/:(\w+)/g)].map(([, parameter]) => parameter))
      expect(operation?.operationId).toBe(name)
      expect(operation?.security, path).toHaveLength(endpoint.access === 'public' ? 0 : 1)
    }
  })

  it('has no reference that leads nowhere', async () => {
    const document = await read()
    const all = references(document)
    expect(all).toContain('#/components/schemas/Error')
    expect(all.filter((reference) => resolve(document, reference) === undefined)).toEqual([])
  })
})
