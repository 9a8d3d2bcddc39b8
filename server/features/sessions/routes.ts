import { Router } from 'express'
import { getToday } from '#shared/contract/session'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { getDay } from './service'

export function sessionsRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, getToday, ({ actor, params, query }) => getDay(dependencies, actor, params.athleteId, query.day))
  return router
}
