import { describe, expect, it } from 'vitest'
import { DEMO_ACCOUNTS, ATHLETES, DEMO_PASSWORDS, ILSE, OSWIN, STAFF } from '../../../seeds/demo/people'
import { CLUBS, PLACES } from '../../../seeds/demo/clubs'
import { PLANNED_SLUGS, plannedDay } from '../../../seeds/demo/programmes'
import { COMING_DAYS, dayAt, PAST_DAYS, sessionsOf, type Strength } from '../../../seeds/demo/sessions'
import { soreJointsOf } from '../../../seeds/demo/soreness'
import { demoAccount } from '#shared/contract/auth'
import { password } from '#shared/contract/common'
import { LIMITS } from '#shared/contract/limits'
import { ROLES } from '#shared/contract/me'
import { place } from '#shared/contract/place'
import { MIDLINE_JOINTS } from '#shared/mechanics/vocabulary'
import { readCatalogue } from '#server/database/seed-catalogue'

const NOW = new Date('2026-12-01T14:00:00.000Z')
/** Strength that is no body's: these tests look at the calendar, not at loads. */
const strength: Strength = {
  unit: () => 'repetitions',
  pieces: () => 1,
  workingLoad: (_athlete, _planned, share) => 20 * share,
}

describe('the demo’s people', () => {
  it('are one admin, two coaches, one physio and fourteen athletes of every sex and grade, one of them a minor', () => {
    const roles = STAFF.map(({ role }) => role).toSorted()
    expect(roles).toEqual(['admin', 'coach', 'coach', 'physio'])
    expect(ATHLETES).toHaveLength(14)
    expect(new Set(ATHLETES.map(({ sex }) => sex))).toEqual(new Set(['male', 'female', 'unspecified']))
    expect(new Set(ATHLETES.map(({ skill }) => skill))).toEqual(new Set(['beginner', 'intermediate', 'advanced']))
    expect(ATHLETES.filter(({ age }) => age < 18)).toHaveLength(1)
    expect(ATHLETES.filter(({ consents }) => !consents)).toHaveLength(1)
  })

  it('sign in with addresses and passwords that the contract takes, in every role of both clubs', () => {
    const everybody = [...ATHLETES, ...STAFF]
    expect(new Set(everybody.map(({ email }) => email)).size).toBe(everybody.length)
    for (const text of Object.values(DEMO_PASSWORDS)) expect(password.parse(text)).toBe(text)
    for (const account of DEMO_ACCOUNTS) expect(demoAccount.parse(account)).toEqual(account)
    for (const { name } of CLUBS) {
      const roles = DEMO_ACCOUNTS.filter(({ clubName }) => clubName === name).map(({ role }) => role)
      expect(new Set(roles)).toEqual(new Set(ROLES))
    }
  })

  it('have bodies within the limits of the contract', () => {
    for (const { bodyMass, stature } of ATHLETES) {
      expect(bodyMass).toBeGreaterThanOrEqual(LIMITS.bodyMass.min)
      expect(stature).toBeLessThanOrEqual(LIMITS.stature.max)
    }
  })

  it('train at places with and without cables, and the one the demo is told from may use both', () => {
    for (const each of PLACES) expect(place.parse(each)).toEqual(each)
    const cables = (clubIds: string[]) =>
      PLACES.filter(({ clubId }) => clubIds.includes(clubId)).map(({ equipment }) =>
        equipment.some(({ kind }) => kind === 'cableHigh'),
      )
    expect(new Set(cables(ILSE.clubs.map(({ id }) => id)))).toEqual(new Set([true, false]))
  })
})

describe('the demo’s calendar', () => {
  it('plans only exercises that the catalogue has', async () => {
    const slugs = new Set((await readCatalogue()).map(({ slug }) => slug))
    expect(PLANNED_SLUGS.filter((slug) => !slugs.has(slug))).toEqual([])
  })

  it('reaches from twelve weeks back to two weeks ahead, the same for the same day', () => {
    for (const athlete of ATHLETES) {
      const sessions = sessionsOf(athlete, NOW, strength)
      expect(sessions.length).toBeGreaterThanOrEqual(24)
      expect(sessions[0]!.day >= dayAt(NOW, -PAST_DAYS)).toBe(true)
      expect(sessions.at(-1)!.day <= dayAt(NOW, COMING_DAYS)).toBe(true)
      expect(new Set(sessions.map(({ day }) => day)).size).toBe(sessions.length)
      expect(sessionsOf(athlete, NOW, strength)).toEqual(sessions)
    }
  })

  it('has a session today for the athletes it is told from, a pull day for the first', () => {
    expect(plannedDay(ILSE, 0)?.title).toBe('Pull day')
    expect(
      plannedDay(ILSE, 0)
        ?.exercises.slice(0, 3)
        .map(({ slug, sets, count }) => [slug, sets, count]),
    ).toEqual([
      ['front-lever-tuck', 5, 8],
      ['pull-up-overhand', 4, 6],
      ['chest-supported-row-dumbbells', 3, 10],
    ])
    expect(plannedDay(OSWIN, 0)?.exercises[0]?.slug).toBe('barbell-back-squat')
  })

  it('builds up, with a lighter week in every four', () => {
    const squats = sessionsOf(OSWIN, NOW, strength).flatMap(({ offset, slots }) =>
      slots
        .filter(({ slug, position }) => slug === 'barbell-back-squat' && position === 1)
        .map(({ planned }) => ({ offset, ...planned })),
    )
    const past = squats.filter(({ offset }) => offset <= 0)
    expect(past.at(-1)!.load!).toBeGreaterThan(past[0]!.load!)
    expect(new Set(past.map(({ sets }) => sets))).toEqual(new Set([3, 4]))
  })
})

describe('the demo’s soreness', () => {
  const all = ATHLETES.flatMap((athlete) => soreJointsOf(athlete, NOW))

  it('is the same for the same day and keeps to what the database demands', () => {
    expect(ATHLETES.flatMap((athlete) => soreJointsOf(athlete, NOW))).toEqual(all)
    for (const { joint, side, rating, state, closedAt, redFlags, clearedAt, reportedAt } of all) {
      expect(side === null).toBe(MIDLINE_JOINTS.includes(joint))
      expect(rating).toBeGreaterThanOrEqual(0)
      expect(rating).toBeLessThanOrEqual(10)
      expect(state === 'closed').toBe(closedAt !== null)
      if (closedAt !== null) expect(closedAt.getTime()).toBeGreaterThan(reportedAt.getTime())
      expect(state === 'redFlag').toBe(closedAt === null && redFlags.length > 0 && clearedAt === null)
      expect(reportedAt.getTime()).toBeLessThan(NOW.getTime())
    }
  })

  it('leaves the athletes it is told from free, with a history behind them, and somebody under a red flag', () => {
    for (const athlete of [ILSE, OSWIN]) {
      const own = soreJointsOf(athlete, NOW)
      expect(own.length).toBeGreaterThan(0)
      expect(own.every(({ state }) => state === 'closed')).toBe(true)
    }
    expect(all.filter(({ state }) => state === 'redFlag')).toHaveLength(1)
    expect(all.filter(({ clearedAt }) => clearedAt !== null)).toHaveLength(1)
    expect(all.filter(({ state }) => state === 'open').length).toBeGreaterThanOrEqual(3)
  })

  it('holds on any day of the year', () => {
    for (let day = 0; day < 366; day += 13) {
      const now = new Date(NOW.getTime() + day * 24 * 3600 * 1000)
      const standing = ATHLETES.flatMap((athlete) =>
        soreJointsOf(athlete, now)
          .filter(({ state }) => state !== 'closed')
          .map(({ joint, side }) => [athlete.name, joint, side].join()),
      )
      expect(new Set(standing).size).toBe(standing.length)
      expect(standing.some((text) => text.startsWith(ILSE.name))).toBe(false)
    }
  })
})
