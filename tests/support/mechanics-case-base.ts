import type { ExerciseMechanics, Frame } from '#shared/mechanics/definition'

/**
 * Plain postures of single ideas, for checks of mechanics that must not depend on the catalogue. Each repeats one posture or two
 * near ones; what they mean is in their names.
 */
export const base = {
  guidance: 'freeWeight',
  sides: 'both',
  grip: 'overhand',
  gripWidth: 'shoulder',
  armPlane: 'sagittal',
  supports: ['feet'],
  loads: [{ at: 'hands', direction: 'down' }],
  referenceLoad: 0.2,
} satisfies Partial<ExerciseMechanics>

/** One posture held: the two frames a definition needs are the same. */
export const held = (frame: Omit<Frame, 'name'>): Frame[] => [
  { name: 'first', ...frame },
  { name: 'second', ...frame },
]

/** Standing straight. */
export const upright = { trunk: { lean: 0 }, legs: { hip: 0, knee: 0 } } satisfies Partial<Frame>
