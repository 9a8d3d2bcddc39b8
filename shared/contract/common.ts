import { z } from 'zod'
import { ERROR_CODES } from './error-codes'
import { LIMITS } from './limits'

export const id = z.uuid()
export const slug = z
  .string()
  .max(80)
  .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Use lower-case letters, digits and single hyphens.')
/** Years that calendars and databases agree on; nobody who trains was born before them. */
const inOurTime = (text: string) => text >= '1900' && text < '2200'
/** Calendar day in the athlete's own time zone, YYYY-MM-DD. */
export const day = z.iso.date().refine(inOurTime, 'Give a day between 1900 and 2199.')
export const instant = z.iso.datetime().refine(inOurTime, 'Give a time between 1900 and 2199.')
export const email = z
  .email('Enter an e-mail address, such as name@example.org.')
  .max(LIMITS.email.max, `Use at most ${LIMITS.email.max} characters.`)
export const password = z
  .string()
  .min(LIMITS.password.min, `Use at least ${LIMITS.password.min} characters.`)
  .max(LIMITS.password.max)
export const note = z.string().trim().max(LIMITS.note.max, `Keep it to ${LIMITS.note.max} characters.`)
export const side = z.enum(['left', 'right'])

/** The one error shape of the API. `fields` names each offending input by its dotted path. */
export const errorBody = z.object({
  error: z.object({
    code: z.enum(ERROR_CODES),
    message: z.string(),
    fields: z.array(z.object({ path: z.string(), message: z.string() })),
    requestId: z.string(),
  }),
})
export type ErrorBody = z.infer<typeof errorBody>

/** The one list shape of the API. */
export const list = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() })

export const pageQuery = z.object({
  cursor: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(LIMITS.pageSize.max).default(LIMITS.pageSize.default),
})
