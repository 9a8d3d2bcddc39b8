import type { EntityManager } from 'typeorm'
import type { Place } from '#shared/contract/place'

/** The equipment of place `pl` as the contract's JSON, in the order of its names so that it is always the same text. */
export const EQUIPMENT_JSON = `
  coalesce((
    select jsonb_agg(jsonb_build_object(
             'kind', pe.kind,
             'steps', case when pe.first_load is null then null
                      else jsonb_build_object('first', pe.first_load, 'step', pe.load_step, 'last', pe.last_load) end
           ) order by pe.kind)
      from place_equipment pe where pe.place_id = pl.id
  ), '[]'::jsonb)`

export interface PlaceRow {
  id: string
  clubId: string
  name: string
  equipment: Place['equipment']
}

/** Places of the given clubs by name. */
export const findPlaces = (manager: EntityManager, clubIds: readonly string[]): Promise<PlaceRow[]> =>
  manager.query(
    `select pl.id, pl.club_id as "clubId", pl.name, ${EQUIPMENT_JSON} as equipment
       from places pl
      where pl.club_id = any($1::uuid[])
      order by pl.name, pl.id`,
    [clubIds],
  )
