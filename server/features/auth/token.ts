import { createHash, randomBytes } from 'node:crypto'

/** 256 random bits, safe in a URL. */
export const newToken = (): string => randomBytes(32).toString('base64url')

/** What is stored of a token. It has 256 random bits, so a fast hash is enough. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('hex')
