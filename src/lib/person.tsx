import { createContext, useContext } from 'react'
import type { Me, Role } from '#shared/contract/me'

const PersonContext = createContext<Me | null>(null)

/** Set by the layout around every page that needs a signed-in person. */
export const PersonProvider = PersonContext

/** The signed-in person; only inside pages behind the sign-in. */
export function usePerson(): Me {
  const person = useContext(PersonContext)
  if (person === null) throw new Error('This page needs a signed-in person.')
  return person
}

export const hasRole = (person: Me, ...roles: Role[]): boolean =>
  person.memberships.some(({ role }) => roles.includes(role))
