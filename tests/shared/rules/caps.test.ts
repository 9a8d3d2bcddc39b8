import { describe, expect, it } from 'vitest'
import { JOINTS } from '#shared/mechanics/index'
import { PROVOCATIONS } from '#shared/contract/sore-joint'
import { capsFromSoreness, type Cap } from '#shared/rules/index'
import { otherCapOf } from '#shared/rules/caps'
import { ruleSet, soreJoint } from './movements'

const limits = (caps: readonly Cap[]) => Object.fromEntries(caps.map(({ channel, limit }) => [channel, limit]))

describe('caps from a sore joint', () => {
  it('bind what provokes it by its rating, and the rest of the joint at half the reduction', () => {
    expect(limits(capsFromSoreness([soreJoint({ rating: 4, provocations: ['bending'] })], ruleSet))).toEqual({
      elbowFlexion: 0.5,
      elbowExtension: 0.75,
      gripPull: 0.75,
      leaning: 0.75,
      endRange: 0.75,
    })
  })

  it('name the cap on the other work, unless all of the joint is bound', () => {
    expect(otherCapOf(soreJoint({ rating: 4, provocations: ['bending'] }), ruleSet)).toBe(0.75)
    expect(otherCapOf(soreJoint({ rating: 4, provocations: ['unknown'] }), ruleSet)).toBeNull()
    expect(otherCapOf(soreJoint({ rating: 4, provocations: ['bending'], redFlags: ['nerve'] }), ruleSet)).toBe(0)
  })

  it('bind everything when the athlete does not know what provokes it', () => {
    const caps = capsFromSoreness([soreJoint({ rating: 5, provocations: ['unknown', 'bending'] })], ruleSet)
    expect(new Set(caps.map(({ limit }) => limit))).toEqual(new Set([0.4]))
  })

  it('bind everything when nothing of the joint answers to what provokes it', () => {
    const caps = capsFromSoreness(
      [soreJoint({ joint: 'knee', side: 'left', rating: 3, provocations: ['gripping'] })],
      ruleSet,
    )
    expect(caps.every(({ limit, side }) => limit === 0.6 && side === 'left')).toBe(true)
  })

  it('stop everything at a red flag, given or by a rating of 8', () => {
    for (const change of [{ redFlags: ['nerve' as const] }, { rating: 8 }, { rating: 10 }]) {
      const caps = capsFromSoreness([soreJoint(change)], ruleSet)
      expect(caps.length).toBeGreaterThan(0)
      expect(caps.every(({ limit }) => limit === 0)).toBe(true)
    }
  })

  it('leave the joint alone at a rating of 0', () => {
    expect(capsFromSoreness([soreJoint({ rating: 0 })], ruleSet).every(({ limit }) => limit === 1)).toBe(true)
  })

  it('never bind less for a worse rating, whatever the joint and provocation', () => {
    for (const joint of JOINTS) {
      for (const provocation of PROVOCATIONS) {
        for (let rating = 1; rating <= 10; rating++) {
          const better = capsFromSoreness(
            [soreJoint({ joint, rating: rating - 1, provocations: [provocation] })],
            ruleSet,
          )
          const worse = capsFromSoreness([soreJoint({ joint, rating, provocations: [provocation] })], ruleSet)
          worse.forEach((cap, index) => expect(cap.limit).toBeLessThanOrEqual(better[index]!.limit))
        }
      }
    }
  })
})
