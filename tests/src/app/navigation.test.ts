import { describe, expect, it } from 'vitest'
import { ROLES, type Role } from '#shared/contract/me'
import { homeFor, placesFor, splitForPhone } from '@/app/navigation'
import { aPerson } from '#tests/src/support/samples'

const withRoles = (...roles: Role[]) =>
  aPerson({ memberships: roles.map((role) => ({ clubId: 'c', clubName: 'Quarry Lane', role })) })
const labels = (...roles: Role[]) => placesFor(withRoles(...roles)).map(({ label }) => label)

describe('where a person can go', () => {
  it.each([
    [['athlete'], ['Today', 'Joints', 'Me']],
    [['coach'], ['Squad', 'Catalogue', 'Me']],
    [['physio'], ['Clients', 'Me']],
    [['admin'], ['Flags', 'Trail', 'Me']],
    [
      ['coach', 'athlete'],
      ['Today', 'Joints', 'Squad', 'Catalogue', 'Me'],
    ],
  ] as Array<[Role[], string[]]>)('%j: %j', (roles, expected) => expect(labels(...roles)).toEqual(expected))

  it('fits in a phone’s bar of four, and what does not is reached from Me', () => {
    const places = placesFor(withRoles(...ROLES))
    const { bar, rest } = splitForPhone(places)
    expect(bar).toHaveLength(4)
    expect(bar.at(-1)?.label).toBe('Me')
    expect([...bar, ...rest].map(({ to }) => to).toSorted()).toEqual(places.map(({ to }) => to).toSorted())
  })

  it('starts where the first role works', () => {
    expect(homeFor(withRoles('physio'))).toBe('/clients')
    expect(homeFor(withRoles('admin', 'athlete'))).toBe('/today')
    expect(homeFor(withRoles())).toBe('/me')
  })
})
