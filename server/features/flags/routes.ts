import { Router } from 'express'
import { listFlags, raiseFlag } from '#shared/contract/flag'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { list, raise } from './service'

export function flagsRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, raiseFlag, ({ actor, body }) => raise(dependencies, actor, body))
  mount(router, listFlags, ({ actor, query }) => list(dependencies, actor, query))
  return router
}
