import { describe, expect, it } from 'vitest'
import type { Equipment, LoadSteps } from '#shared/contract/place'
import { rank } from '#shared/rules/index'
import { candidateOf, candidatesFor, man, requestOf, ruleSet, soreJoint } from './movements'

const row = (result: ReturnType<typeof rank>, slug: string) =>
  result.items.find(({ exercise }) => exercise.slug === slug)
const out = (result: ReturnType<typeof rank>, slug: string) =>
  result.leftOut.find(({ exercise }) => exercise.slug === slug)
const placeWith = (...kinds: Array<[Equipment, LoadSteps | null]>) => ({ id: 'place', equipment: new Map(kinds) })

describe('what is left out', () => {
  it('says what the place lacks', () => {
    const result = rank(requestOf({ place: placeWith(['pullUpBar', null]) }), ruleSet)
    expect(out(result, 'pulldown')).toMatchObject({
      why: 'noEquipment',
      reason: 'Needs lat pulldown, not found at this place.',
    })
  })

  it('takes other equipment that serves as well', () => {
    const candidates = [...candidatesFor('male').slice(2), candidateOf('pulldown', { orEquipment: [['cableHigh']] })]
    const request = { candidates, original: candidateOf('pull-up'), place: placeWith(['cableHigh', null]) }
    expect(row(rank(requestOf(request), ruleSet), 'pulldown')).toBeDefined()
  })

  it('says which joint is over which cap, and the assistance that would help', () => {
    const reason = out(rank(requestOf(), ruleSet), 'pull-up')
    expect(reason?.why).toBe('overCap')
    expect(reason?.reason).toMatch(
      /^Right elbow at \d+ % even with body weight alone; the cap is 50 %\. With \d+ kg of assistance it would fit\.$/,
    )
  })

  it('says how far beyond current strength an exercise is, and names its assisted form', () => {
    const weak = { ...man, factors: { shoulderAdduction: 0.5 } }
    const candidates = candidatesFor('male').map((candidate) =>
      candidate.document.slug === 'pull-up' ? candidateOf('pull-up', { assistedForm: 'assisted-pull-up' }) : candidate,
    )
    const result = rank(requestOf({ athlete: weak, candidates, originalSlug: 'pulldown', sore: [] }), ruleSet)
    expect(out(result, 'pull-up')?.why).toBe('beyondStrength')
    expect(out(result, 'pull-up')?.reason).toMatch(
      /With \d+ kg of assistance \(assisted-pull-up\) it would become possible\.$/,
    )
  })

  it('leaves out what is graded above the athlete', () => {
    const result = rank(requestOf({ athlete: { ...man, skill: 'beginner' }, originalSlug: 'pulldown' }), ruleSet)
    expect(out(result, 'pull-up')).toMatchObject({ why: 'beyondSkill' })
  })

  it('leaves out what does not train the target, muscles held still among them', () => {
    const result = rank(requestOf({ originalSlug: 'push-up', target: 'frontShoulder', sore: [] }), ruleSet)
    expect(out(result, 'knee-extension')?.why).toBe('targetNotTrained')
    expect(out(result, 'dumbbell-curl')?.why).toBe('targetNotTrained')
  })
})

describe('a red flag', () => {
  const flagged = (joint: 'elbow' | 'shoulder' | 'knee') =>
    soreJoint({ joint, redFlags: ['nerve'], soreJointId: '00000003-0000-4000-8000-000000000009' })

  it('offers nothing when the original or the target works across the joint', () => {
    for (const joint of ['elbow', 'shoulder'] as const) {
      const result = rank(requestOf({ sore: [flagged(joint)] }), ruleSet)
      expect(result.items).toEqual([])
      expect(result.leftOut.length).toBeGreaterThan(0)
      expect(result.leftOut.every(({ why }) => why === 'redFlag')).toBe(true)
      expect(result.redFlags).toEqual([
        expect.objectContaining({ joint, side: 'right', flags: ['nerve'], urgent: true }),
      ])
      expect(result.sore).toEqual([])
    }
  })

  it('elsewhere leaves out only what loads the joint', () => {
    const result = rank(requestOf({ originalSlug: 'pullover-machine', sore: [flagged('knee')] }), ruleSet)
    expect(row(result, 'pulldown')).toBeDefined()
    expect(out(result, 'straight-arm-pulldown')?.why).toBe('redFlag')
  })

  it('follows from a rating of 8', () => {
    const result = rank(requestOf({ sore: [soreJoint({ rating: 8 })] }), ruleSet)
    expect(result.items).toEqual([])
    expect(result.redFlags[0]).toMatchObject({ flags: ['severePain'], urgent: false })
  })

  it('of chest pain or breathlessness stops everything, whatever the joint', () => {
    const sore = [soreJoint({ joint: 'ankle', redFlags: ['chestOrBreath'] })]
    const result = rank(requestOf({ originalSlug: 'pullover-machine', sore }), ruleSet)
    expect(result.items).toEqual([])
    expect(result.leftOut[0]?.reason).toContain('Chest pain or breathlessness')
  })
})

describe('the dose', () => {
  it('takes the settings of the place and rounds down', () => {
    const steps = { first: 7, step: 7, last: 84 }
    const fine = rank(requestOf(), ruleSet)
    const coarse = rank(requestOf({ place: placeWith(['latPulldown', steps]) }), ruleSet)
    const load = row(coarse, 'pulldown')!.dose.load!
    expect(load % 7).toBe(0)
    expect(load).toBeLessThanOrEqual(row(fine, 'pulldown')!.dose.load!)
    expect(load + 7).toBeGreaterThan(row(fine, 'pulldown')!.dose.load!)
  })

  it('makes up for a capped load with repetitions for size, and shows the loss for strength', () => {
    const size = row(rank(requestOf({ intent: 'size' }), ruleSet), 'pulldown')!
    const strength = row(rank(requestOf({ intent: 'strength' }), ruleSet), 'pulldown')!
    expect(size.dose.repetitions).toBeGreaterThan(6)
    expect(strength.dose).toMatchObject({ repetitions: 6, load: size.dose.load })
    expect(strength.reason).toMatch(/It keeps \d+ % of the planned intensity\.$/)
    expect(strength.factors.kept.value).toBeLessThan(size.factors.kept.value)
  })

  it('rounds assistance up and writes it as a negative load', () => {
    const bands = { first: 5, step: 10, last: 55 }
    const capped = requestOf({ place: placeWith(['bands', bands]), sore: [soreJoint({ rating: 5 })] })
    const dose = row(rank(capped, ruleSet), 'assisted-pull-up')!.dose
    const fine = row(rank({ ...capped, place: null }, ruleSet), 'assisted-pull-up')!.dose
    expect([-5, -15, -25, -35, -45, -55]).toContain(dose.load)
    expect(dose.load!).toBeLessThanOrEqual(fine.load!)
  })

  it('gives body weight alone no load, a pair of dumbbells the load of one, and a hold seconds', () => {
    const pressing = rank(requestOf({ originalSlug: 'push-up', target: 'frontShoulder', sore: [] }), ruleSet)
    const curls = rank(requestOf({ originalSlug: 'pulldown', target: 'biceps', sore: [] }), ruleSet)
    expect(row(curls, 'dumbbell-curl')!.dose).toMatchObject({ pieces: 2 })
    expect(row(curls, 'dumbbell-curl')!.dose.load).toBeGreaterThan(2)
    const holds = [...pressing.items, ...pressing.leftOut].find(({ exercise }) => exercise.slug === 'handstand-hold')
    expect(holds).toBeDefined()
    const strong = { ...man, factors: { shoulderAdduction: 2, grip: 2, elbowFlexion: 2 } }
    const pulls = rank(requestOf({ athlete: strong, originalSlug: 'pulldown', sore: [] }), ruleSet)
    expect(row(pulls, 'pull-up')!.dose.load).toBeGreaterThan(0)
    const alone = rank(
      requestOf({ athlete: strong, originalSlug: 'pulldown', sore: [], place: placeWith(['pullUpBar', null]) }),
      ruleSet,
    )
    expect(row(alone, 'pull-up')!.dose.load).toBeNull()
  })
})

describe('the original', () => {
  it('is not among its own swaps while no sore joint is loaded by it', () => {
    for (const sore of [[], [soreJoint({ joint: 'knee' })]]) {
      const result = rank(requestOf({ originalSlug: 'pullover-machine', sore }), ruleSet)
      expect([...result.items, ...result.leftOut].some(({ exercise }) => exercise.slug === 'pullover-machine')).toBe(
        false,
      )
    }
  })

  it('stands among them with a lighter dose when it fits under the caps', () => {
    const result = rank(requestOf({ originalSlug: 'pulldown' }), ruleSet)
    expect(row(result, 'pulldown')?.dose.load).toBeLessThan(result.originalRow!.dose.load ?? 80)
  })

  it('is shown as planned, over its cap, and not at all when it is beyond current strength', () => {
    const result = rank(requestOf(), ruleSet)
    const elbow = result.originalRow!.joints.find(({ joint }) => joint === 'elbow')!
    expect(elbow.stress).toBeGreaterThan(elbow.cap!)
    expect(result.originalRow!.dose.load).toBeNull()
    const loaded = requestOf()
    expect(rank({ ...loaded, planned: { ...loaded.planned, load: 200 } }, ruleSet).originalRow).toBeNull()
  })
})

describe('the answer', () => {
  it('marks estimates and minors', () => {
    expect(rank(requestOf(), ruleSet)).toMatchObject({ estimated: true, minor: false })
    const own = { ...man, factors: { grip: 1.1 }, minor: true }
    expect(rank(requestOf({ athlete: own }), ruleSet)).toMatchObject({ estimated: false, minor: true })
  })

  it('breaks ties by name', () => {
    const twins = ['b', 'a', 'c'].map((name) => ({ ...candidateOf('pulldown', { name }), id: `twin-${name}` }))
    const result = rank(requestOf({ candidates: twins, original: candidateOf('pull-up') }), ruleSet)
    expect(result.items.map(({ exercise, rank: at }) => [exercise.name, at])).toEqual([
      ['a', 1],
      ['b', 2],
      ['c', 3],
    ])
  })

  it('wants coordination in a skill slot and calm elsewhere', () => {
    const size = row(rank(requestOf({ sore: [] }), ruleSet), 'pullover-machine')!
    const skill = row(rank(requestOf({ sore: [], intent: 'skill' }), ruleSet), 'pullover-machine')!
    expect(size.factors.calm.value).toBeGreaterThan(0.95)
    expect(skill.factors.calm.value).toBeLessThan(0.65)
  })

  it('makes the score of its factors', () => {
    for (const { score, factors } of rank(requestOf(), ruleSet).items) {
      const product = Object.values(factors).reduce((total, { value }) => total * value, 100)
      expect(score).toBeCloseTo(product, 9)
    }
  })
})
