import { Router } from 'express'
import * as contract from '#shared/contract/audit'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { listAudit } from './service'

export function auditRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, contract.listAudit, ({ actor, query }) => listAudit(dependencies, actor, query))
  return router
}
