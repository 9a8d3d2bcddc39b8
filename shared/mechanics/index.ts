/** The only door to the mechanics: geometry in, affine joint coefficients out. */
export * from './definition'
export * from './errors'
export * from './sex'
export * from './solution'
export * from './vocabulary'
export { solveExercise } from './solve'
export { axisOfAction } from './direct-moments'
export { SEGMENTS, type SegmentTable } from './segments'
