import { Router } from 'express'
import * as athletes from '#shared/contract/athlete'
import * as contract from '#shared/contract/me'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { changeConsent, listCareTeam } from './care-team'
import { changeMe, readMe } from './service'

export function meRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, contract.getMe, ({ actor }) => readMe(dependencies, actor.userId))
  mount(router, contract.updateMe, ({ actor, body }) => changeMe(dependencies, actor, body))
  mount(router, athletes.listCareTeam, async ({ actor }) => ({
    items: await listCareTeam(dependencies, actor),
    nextCursor: null,
  }))
  mount(router, athletes.setConsent, ({ actor, params, body }) =>
    changeConsent(dependencies, actor, params.userId, body.letIn),
  )
  return router
}
