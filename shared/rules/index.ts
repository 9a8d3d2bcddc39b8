/**
 * The rules: strength, caps, joint stress, coordination, dose and ranking. Pure; the rule set and everything else
 * come in as arguments. The only door of this folder.
 */
export { strengths } from './strength'
export { capsFromSoreness } from './caps'
export { coordinationDemand } from './coordination'
export { affectedBy, type Affected } from './affected'
export { previewOf } from './preview'
export { musclesOf } from './muscles'
export { intensity, oneRepMax, repetitionsAt } from './dose'
export { roundToSteps } from './load-steps'
export { rank } from './rank'
export { rankTop, type TopRequest } from './fast-rank'
export { packCatalogue, type PackedCatalogue } from './pack'
export { averageAdult } from './average-adult'
export type * from './types'
