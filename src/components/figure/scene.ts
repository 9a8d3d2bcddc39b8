import type { Box } from './geometry'

/** What a shape stands for; the component gives each its colour, so that theme and print differ only there. */
export type Ink =
  'ground' | 'pad' | 'iron' | 'plate' | 'rod' | 'strap' | 'band' | 'wheel' | 'bodyFar' | 'body' | 'force' | 'forceHead'

/** One shape of the drawing. Larger `layer` is nearer the onlooker. */
export interface Shape {
  ink: Ink
  path: string
  layer: number
  box: Box
}
