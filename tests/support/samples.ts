import type { SoreJointReport } from '#shared/contract/sore-joint'

/** A right elbow, 4 of 10, provoked by bending under load, with every red-flag question answered no. */
export const soreReport = (change: Partial<SoreJointReport> = {}): SoreJointReport => ({
  joint: 'elbow',
  side: 'right',
  rating: 4,
  provocations: ['bending'],
  redFlags: {
    injury: false,
    nerve: false,
    swollenOrFever: false,
    nightPain: false,
    severePain: false,
    chestOrBreath: false,
  },
  note: '',
  day: '2026-03-02',
  ...change,
})
