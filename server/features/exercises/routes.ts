import { Router } from 'express'
import { getExercise, listExercises, previewExercise } from '#shared/contract/exercise'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { get, list, preview } from './service'

export function exercisesRoutes(dependencies: Dependencies): Router {
  const router = Router()
  mount(router, listExercises, ({ query }) => list(dependencies, query))
  mount(router, previewExercise, ({ actor, body }) => preview(dependencies, actor, body))
  mount(router, getExercise, ({ params }) => get(dependencies, params.slug))
  return router
}
