import type { Place } from '#shared/contract/place'
import type { PlaceRow } from './repository'

export const presentPlace = ({ id, clubId, name, equipment }: PlaceRow): Place => ({ id, clubId, name, equipment })
