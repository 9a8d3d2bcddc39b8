import { Router } from 'express'
import { rankForExercise, rankForSlot, takeSwap, undoSwap } from '#shared/contract/swap'
import type { Dependencies } from '../../dependencies'
import { mount, Serialized } from '../../middleware/mount'
import { RankingMemory } from './ranking-memory'
import { rankExercise, rankSlot, take, undo } from './service'

export function swapsRoutes(dependencies: Dependencies): Router {
  const router = Router()
  const context = { dependencies, memory: new RankingMemory(dependencies.catalogue) }
  mount(router, rankForSlot, async ({ actor, params, query }) => {
    return new Serialized(await rankSlot(context, actor, { params, query }))
  })
  mount(router, rankForExercise, async ({ actor, params, query }) => {
    return new Serialized(await rankExercise(context, actor, { params, query }))
  })
  mount(router, takeSwap, ({ actor, params, query, body }) => take(context, actor, { params, query, body }))
  mount(router, undoSwap, ({ actor, params }) => undo(context, actor, params.swapId))
  return router
}
