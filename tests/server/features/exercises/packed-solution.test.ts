import { describe, expect, it } from 'vitest'
import { SEXES } from '#shared/mechanics/sex'
import { solveExercise } from '#shared/mechanics/index'
import { readCatalogue } from '#server/database/seed-catalogue'
import { packSolution, unpackSolution } from '#server/features/exercises/packed-solution'

describe('a packed solution', () => {
  it('comes back as it was, for every exercise of the catalogue and every sex', async () => {
    const documents = await readCatalogue()
    expect(documents.length).toBeGreaterThan(0)
    for (const { mechanics } of documents) {
      for (const sex of SEXES) {
        const solution = solveExercise(mechanics, sex)
        expect(unpackSolution(packSolution(solution))).toEqual(solution)
      }
    }
  })

  it('is far smaller than its JSON', async () => {
    const [document] = await readCatalogue()
    const solution = solveExercise(document!.mechanics, 'male')
    expect(packSolution(solution).length * 1.5).toBeLessThan(JSON.stringify(solution).length)
  })

  it('refuses to be read when it is cut short', async () => {
    const [document] = await readCatalogue()
    const packed = Buffer.from(packSolution(solveExercise(document!.mechanics, 'male')))
    expect(() => unpackSolution(packed.subarray(0, packed.length - 4))).toThrow()
  })
})
