/** In which capacity somebody looks at an athlete's training. */
export interface Capacity {
  self: boolean
  coach: boolean
}

/** The athlete and their coach change what stands in a slot; a physio only reads. */
export const canSwap = ({ self, coach }: Capacity): boolean => self || coach
