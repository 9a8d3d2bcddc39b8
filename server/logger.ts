import { pino, type Logger } from 'pino'
import { QueryFailedError } from 'typeorm'
import type { Env } from './env'

const frames = (stack: string | undefined) => (stack ?? '').split('\n').filter((line) => /^\s+at /.test(line))

/**
 * What may be written of an error. A failed query carries its parameters, and PostgreSQL repeats values in its
 * sentences, so of those only the code and the place are kept.
 */
export function serializeError(error: unknown): Record<string, unknown> {
  if (error instanceof QueryFailedError) {
    const driver = error.driverError as { code?: string; table?: string; constraint?: string; routine?: string }
    const { code, table, constraint, routine } = driver
    return { type: 'QueryFailedError', code, table, constraint, routine, stack: frames(error.stack) }
  }
  if (!(error instanceof Error)) return { type: typeof error }
  const { code } = error as { code?: unknown }
  return {
    type: error.name,
    code: typeof code === 'string' ? code : undefined,
    message: error.message,
    stack: frames(error.stack),
  }
}

/** The only way the server speaks. Takes errors under `err`. */
export const createLogger = (env: Pick<Env, 'LOG_LEVEL'>): Logger =>
  pino({ level: env.LOG_LEVEL, base: null, serializers: { err: serializeError } })
