import { Router } from 'express'
import { listAthletes } from '#shared/contract/athlete'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { list } from './service'

export function athletesRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, listAthletes, ({ actor, query }) => list(dependencies, actor, query))
  return router
}
