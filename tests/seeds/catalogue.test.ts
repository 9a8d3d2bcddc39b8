import { describe, expect, test } from 'vitest'
import { exerciseDocument } from '#shared/contract/exercise'
import { SEXES } from '#shared/mechanics/sex'
import { documents, entries, FILES, solutionOf } from './catalogue'

describe('the catalogue', () => {
  test.each(entries)('$slug is a valid document', ({ content }) => {
    const parsed = exerciseDocument.safeParse(content)
    expect(parsed.error?.issues ?? []).toEqual([])
  })

  test('names every slug and every name once', () => {
    const slugs = entries.map(({ slug }) => slug)
    expect(slugs).toEqual([...new Set(slugs)])
    const names = [...documents.values()].map(({ name }) => name)
    expect(names).toEqual([...new Set(names)])
  })

  test('has exercises in every file', () => {
    for (const file of FILES) expect(entries.filter((each) => each.file === file).length, file).toBeGreaterThan(0)
  })

  test('links easier forms that exist and are easier', () => {
    const grade = { beginner: 0, intermediate: 1, advanced: 2 }
    for (const document of documents.values()) {
      if (document.assistedForm === undefined) continue
      const easier = documents.get(document.assistedForm)
      expect(easier, `${document.slug} → ${document.assistedForm}`).toBeDefined()
      expect(easier!.slug).not.toBe(document.slug)
      expect(grade[easier!.skill], document.slug).toBeLessThanOrEqual(grade[document.skill])
    }
  })

  test('says where each load comes from and keeps its sign', () => {
    for (const { slug, load, equipment, orEquipment, mechanics } of documents.values()) {
      if (load.kind === 'none') {
        expect(mechanics.referenceLoad, slug).toBe(0)
        continue
      }
      expect(load.from, slug).toBeDefined()
      expect(load.least ?? 0, slug).toBeLessThan(load.most ?? Infinity)
      if (load.kind === 'assistance') expect(mechanics.referenceLoad, slug).toBeLessThan(0)
      else expect(mechanics.referenceLoad, slug).toBeGreaterThanOrEqual(0)
      // Added weight is an option; anything else must be there for the exercise to be done at all.
      if (load.kind !== 'added') expect([equipment, ...(orEquipment ?? [])].flat(), slug).toContain(load.from)
    }
  })

  test.each([...documents.keys()].flatMap((slug) => SEXES.map((sex) => ({ slug, sex }))))(
    '$slug can be held by the $sex body',
    ({ slug, sex }) => {
      const { frames } = solutionOf(slug, sex)
      expect(frames).toHaveLength(documents.get(slug)!.mechanics.frames.length)
      for (const frame of frames) {
        for (const { axis, a, b } of frame.terms) expect(Number.isFinite(a) && Number.isFinite(b), axis).toBe(true)
      }
    },
  )
})
