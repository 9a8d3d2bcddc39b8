/** Which segment table and norms apply; unspecified is the mean of both. */
export const SEXES = ['male', 'female', 'unspecified'] as const
export type Sex = (typeof SEXES)[number]
