import { existsSync } from 'node:fs'
import { join, resolve } from 'node:path'
import express, { Router } from 'express'
import { AppError } from '../errors'

const YEAR = 365 * 24 * 60 * 60 * 1000

/** Serves the built client: hashed assets for ever, and index.html for every page URL. */
export function serveClient(directory: string): Router {
  const router = Router()
  const root = resolve(directory)
  const index = join(root, 'index.html')
  router.use(
    '/assets',
    express.static(join(root, 'assets'), { immutable: true, maxAge: YEAR, index: false, fallthrough: true }),
  )
  router.use('/assets', () => {
    throw new AppError('not_found', 'There is nothing at this address.')
  })
  router.use(express.static(root, { index: false, maxAge: 0 }))
  router.use((request, response) => {
    if (request.method !== 'GET' && request.method !== 'HEAD') {
      throw new AppError('method_not_allowed', 'This can be called with GET only.')
    }
    if (!existsSync(index)) throw new AppError('not_found', 'The client is not built. Run: npm start')
    response.setHeader('Cache-Control', 'no-cache')
    response.sendFile(index)
  })
  return router
}
