import type { Equipment, LoadSteps } from '#shared/contract/place'
import { demoId } from './random'

export interface DemoClub {
  id: string
  name: string
}
export interface DemoPlace {
  id: string
  clubId: string
  name: string
  equipment: Array<{ kind: Equipment; steps: LoadSteps | null }>
}

const club = (name: string): DemoClub => ({ id: demoId('club', name), name })
export const QUARRY_LANE = club('Quarry Lane Strength')
export const SALTMARSH = club('Saltmarsh Barbell Room')
export const CLUBS = [QUARRY_LANE, SALTMARSH]

const steps = (first: number, step: number, last: number): LoadSteps => ({ first, step, last })
const DUMBBELLS_OUTDOORS = steps(4, 2, 28)
const DUMBBELLS = steps(2, 2, 44)
/** There is a light bar beside the usual one. */
const BARBELL = steps(10, 2.5, 220)
const PLATES = steps(1.25, 1.25, 60)
const STACK = steps(5, 5, 100)
const FINE_STACK = steps(2.5, 2.5, 60)

function place(owner: DemoClub, name: string, equipment: Partial<Record<Equipment, LoadSteps | null>>): DemoPlace {
  return {
    id: demoId('place', owner.name, name),
    clubId: owner.id,
    name,
    equipment: (Object.entries(equipment) as Array<[Equipment, LoadSteps | null]>).map(([kind, given]) => ({
      kind,
      steps: given,
    })),
  }
}

/** Bars under the open sky: nothing here runs on a cable. */
export const YARD = place(QUARRY_LANE, 'Quarry Lane yard', {
  pullUpBar: null,
  lowBar: null,
  dipBars: null,
  parallettes: null,
  rings: null,
  wall: null,
  box: null,
  flatBench: null,
  inclineBench: null,
  barbell: BARBELL,
  squatRack: null,
  dumbbells: DUMBBELLS_OUTDOORS,
  dipBelt: PLATES,
  bands: steps(5, 5, 60),
})

/** A shed of plates for wet days. */
export const SHED = place(QUARRY_LANE, 'Quarry Lane shed', {
  pullUpBar: null,
  dipBars: null,
  parallettes: null,
  wall: null,
  box: null,
  flatBench: null,
  preacherBench: null,
  barbell: BARBELL,
  squatRack: null,
  dumbbells: DUMBBELLS_OUTDOORS,
  dipBelt: PLATES,
  bands: steps(5, 5, 60),
})

export const ROOM = place(SALTMARSH, 'Saltmarsh room', {
  pullUpBar: null,
  dipBars: null,
  wall: null,
  box: null,
  flatBench: null,
  inclineBench: null,
  preacherBench: null,
  backExtensionBench: null,
  barbell: BARBELL,
  squatRack: null,
  dumbbells: DUMBBELLS,
  dipBelt: PLATES,
  bands: steps(5, 5, 60),
  cableHigh: FINE_STACK,
  cableLow: FINE_STACK,
  latPulldown: STACK,
  cableRow: STACK,
  assistedPullUpMachine: steps(5, 5, 80),
  pulloverMachine: STACK,
  chestPressMachine: STACK,
  shoulderPressMachine: STACK,
  rowMachine: STACK,
  flyMachine: STACK,
  lateralRaiseMachine: FINE_STACK,
  legPress: steps(20, 10, 400),
  hackSquatMachine: steps(20, 5, 200),
  kneeExtensionMachine: STACK,
  legCurlMachine: STACK,
  hipAbductionMachine: STACK,
  hipAdductionMachine: STACK,
  calfRaiseMachine: steps(10, 5, 200),
  abdominalMachine: STACK,
})
export const PLACES = [YARD, SHED, ROOM]
