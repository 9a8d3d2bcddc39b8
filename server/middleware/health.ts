import { Router } from 'express'
import type { Dependencies } from '../dependencies'

/** For a load balancer or a start script: answers once the database does. */
export function healthRoutes({ dataSource }: Dependencies): Router {
  const router = Router()
  router.get('/api/health', async (_request, response) => {
    await dataSource.query('select 1')
    response.json({ status: 'ok' })
  })
  return router
}
