import {
  Activity,
  BookOpen,
  CalendarDays,
  Flag,
  History,
  UserRound,
  Users,
  UsersRound,
  type LucideIcon,
} from 'lucide-react'
import type { Me, Role } from '#shared/contract/me'
import { hasRole } from '@/lib/person'
import { paths } from './paths'

export interface Place {
  to: string
  label: string
  icon: LucideIcon
}

const BY_ROLE: Record<Role, Place[]> = {
  athlete: [
    { to: paths.today(), label: 'Today', icon: CalendarDays },
    { to: paths.joints(), label: 'Joints', icon: Activity },
  ],
  coach: [
    { to: paths.squad(), label: 'Squad', icon: Users },
    { to: paths.catalogue(), label: 'Catalogue', icon: BookOpen },
  ],
  physio: [{ to: paths.clients(), label: 'Clients', icon: UsersRound }],
  admin: [
    { to: paths.flags(), label: 'Flags', icon: Flag },
    { to: paths.trail(), label: 'Trail', icon: History },
  ],
}
const ME: Place = { to: paths.me(), label: 'Me', icon: UserRound }
const ON_PHONES = 4

/** Everywhere this person can go; people with several roles get all of it. */
export function placesFor(person: Me): Place[] {
  const roles = (Object.keys(BY_ROLE) as Role[]).filter((role) => hasRole(person, role))
  return [...roles.flatMap((role) => BY_ROLE[role]), ME]
}

/** The bottom bar holds four; what does not fit is reached from Me. */
export function splitForPhone(places: Place[]): { bar: Place[]; rest: Place[] } {
  if (places.length <= ON_PHONES) return { bar: places, rest: [] }
  return { bar: [...places.slice(0, ON_PHONES - 1), ME], rest: places.slice(ON_PHONES - 1, -1) }
}

export const homeFor = (person: Me): string => placesFor(person)[0]?.to ?? paths.me()
