import { z } from 'zod'

const flag = z.enum(['true', 'false']).transform((value) => value === 'true')
const optional = <T extends z.ZodType>(schema: T) =>
  z.preprocess((value) => (value === '' ? undefined : value), schema.optional())

const LOOPBACK = new Set(['localhost', '127.0.0.1', '[::1]'])

/** A secret a person typed tends to be short or to repeat itself; a generated one never does. */
const isWeak = (secret: string) =>
  secret.length < 32 || new Set(secret).size < 12 || /change|secret|example/i.test(secret)

const schema = z
  .object({
    NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
    HOST: z.string().min(1).default('127.0.0.1'),
    PORT: z.coerce.number().int().min(1).max(65535).default(4380),
    PUBLIC_URL: optional(z.url({ protocol: /^https?$/ })),
    DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
    DATABASE_POOL: z.coerce.number().int().min(2).max(100).default(10),
    ACCESS_TOKEN_SECRET: z.string().min(16),
    /** `local` keeps mails in memory and shows them on a loopback page. */
    SMTP_URL: z.union([z.literal('local'), z.url({ protocol: /^smtps?$/ })]),
    MAIL_PAGE_PORT: z.coerce.number().int().min(0).max(65535).default(0),
    MAIL_FROM: z.string().min(3).default('Pintle <no-reply@pintle.invalid>'),
    PINTLE_DEMO: flag.default(false),
    TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
    RATE_LIMIT_SCALE: z.coerce.number().positive().max(100_000).default(1),
    LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'silent']).default('info'),
    CLIENT_DIR: z.string().default('dist/client'),
  })
  .superRefine((env, context) => {
    if (env.NODE_ENV !== 'production') return
    if (isWeak(env.ACCESS_TOKEN_SECRET)) {
      context.addIssue({
        code: 'custom',
        path: ['ACCESS_TOKEN_SECRET'],
        message: 'too weak for production; use 32 or more random characters, for example from: openssl rand -base64 48',
      })
    }
    const url = env.PUBLIC_URL === undefined ? null : new URL(env.PUBLIC_URL)
    if (url?.protocol === 'http:' && !LOOPBACK.has(url.hostname)) {
      context.addIssue({
        code: 'custom',
        path: ['PUBLIC_URL'],
        message: 'must be https in production, except on loopback',
      })
    }
  })

/** The environment, parsed once at the start. Nothing else reads process.env. */
export type Env = Readonly<z.output<typeof schema>>

/** Parses the environment. Throws one error that lists every wrong variable by name, and never a value. */
export function parseEnv(source: Record<string, string | undefined>): Env {
  const parsed = schema.safeParse(source)
  if (parsed.success) return parsed.data
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`)
  throw new Error(`The environment is not usable:\n${lines.join('\n')}\nSee .env.example.`)
}

/** Where people reach the app; links in mails are made from this, never from a request's Host header. */
export const publicUrl = (env: Env) => (env.PUBLIC_URL ?? `http://127.0.0.1:${env.PORT}`).replace(/\/+$/, '')
