import type { EntityManager } from 'typeorm'
import type { Role } from '#shared/contract/me'
import type { Clock } from '#server/dependencies'
import { hashPassword } from '#server/features/auth/password-hash'
import { AthleteProfile, Club, Consent, Membership, User } from '#server/features/people/entity'

/** Every person a factory makes signs in with this. */
export const TEST_PASSWORD = 'a long enough password'

let counter = 0
/** A number no other row of this test run has, for names and addresses. */
export const next = () => (counter += 1)

let passwordHash: Promise<string> | undefined

/** Makes valid rows and fills in the parents that were not given. */
export class Factories {
  constructor(
    readonly manager: EntityManager,
    readonly clock: Clock,
  ) {}

  club(given: Partial<Club> = {}): Promise<Club> {
    return this.manager.save(Club, { name: `Test Club ${next()}`, ...given })
  }

  /** A person without any role. */
  async user(given: Partial<User> = {}): Promise<User> {
    const number = next()
    passwordHash ??= hashPassword(TEST_PASSWORD)
    return this.manager.save(User, {
      name: `Person ${number}`,
      email: `person.${number}@example.test`,
      passwordHash: await passwordHash,
      ...given,
    })
  }

  async member(role: Role, club?: Club, given: Partial<User> = {}): Promise<User & { club: Club }> {
    const user = await this.user(given)
    const home = club ?? (await this.club())
    await this.manager.save(Membership, { userId: user.id, clubId: home.id, role })
    return Object.assign(user, { club: home })
  }

  /** An athlete with a filled-in body profile, adult unless told otherwise. Pass `profile: null` for none. */
  async athlete({
    club,
    profile = {},
    ...given
  }: Partial<User> & { club?: Club; profile?: Partial<AthleteProfile> | null } = {}): Promise<User & { club: Club }> {
    const athlete = await this.member('athlete', club, given)
    if (profile !== null) {
      await this.manager.save(AthleteProfile, {
        userId: athlete.id,
        sex: 'male',
        bodyMass: 75,
        stature: 1.78,
        birthDate: '1995-06-15',
        ...profile,
      })
    }
    return athlete
  }

  coach(club?: Club, given: Partial<User> = {}) {
    return this.member('coach', club, given)
  }

  physio(club?: Club, given: Partial<User> = {}) {
    return this.member('physio', club, given)
  }

  admin(club?: Club, given: Partial<User> = {}) {
    return this.member('admin', club, given)
  }

  consent(athlete: { id: string }, carer: { id: string }, given: Partial<Consent> = {}): Promise<Consent> {
    return this.manager.save(Consent, {
      athleteId: athlete.id,
      carerId: carer.id,
      grantedAt: this.clock.now(),
      ...given,
    })
  }
}
