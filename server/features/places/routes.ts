import { Router } from 'express'
import { listPlaces } from '#shared/contract/place'
import type { Dependencies } from '../../dependencies'
import { mount } from '../../middleware/mount'
import { clubsOf } from '../people/policy'
import { presentPlace } from './present'
import { findPlaces } from './repository'

export function placesRoutes({ dataSource }: Dependencies): Router {
  const router = Router()
  mount(router, listPlaces, async ({ actor }) => ({
    items: (await findPlaces(dataSource.manager, clubsOf(actor))).map(presentPlace),
    nextCursor: null,
  }))
  return router
}
