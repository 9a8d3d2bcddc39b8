/** Bounds that both edges of the wire enforce. One place, so that a form and the API never disagree. */
export const LIMITS = {
  name: { min: 1, max: 120 },
  email: { max: 254 },
  password: { min: 10, max: 200 },
  note: { max: 2000 },
  search: { max: 80 },
  pageSize: { default: 50, max: 200 },
  /** Body mass in kg: the lightest adult and the heaviest lifter the strength norms could still be scaled to. */
  bodyMass: { min: 25, max: 300 },
  /** Stature in metres. */
  stature: { min: 1.2, max: 2.3 },
  /** External load in kg; negative is assistance. */
  load: { min: -200, max: 600 },
  rating: { min: 0, max: 10 },
  sets: { min: 1, max: 20 },
  repetitions: { min: 1, max: 100 },
  holdSeconds: { min: 1, max: 300 },
  rir: { min: 0, max: 10 },
  /** Rows of a ranking that are sent: the best, and what was left out, most telling reasons first. */
  rankingRows: { items: 500, leftOut: 500 },
  /** Bytes of a JSON request body. */
  requestBody: 256 * 1024,
} as const
