import { Router } from 'express'
import { clearRedFlag, closeSoreJoint, listSoreJoints, reportSoreJoint } from '#shared/contract/sore-joint'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { clear, close, list, report } from './service'

export function soreJointsRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, reportSoreJoint, ({ actor, params, body }) => report(dependencies, actor, params.athleteId, body))
  mount(router, listSoreJoints, ({ actor, params, query }) => list(dependencies, actor, { params, query }))
  mount(router, closeSoreJoint, ({ actor, params }) => close(dependencies, actor, params.athleteId, params.soreJointId))
  mount(router, clearRedFlag, ({ actor, params, body }) => clear(dependencies, actor, { params, body }))
  return router
}
