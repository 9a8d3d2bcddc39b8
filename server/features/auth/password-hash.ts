import argon2 from 'argon2'

/** OWASP's lowest recommended setting for Argon2id: 19 MiB, two passes, one lane (Password Storage Cheat Sheet, M-h). */
const OPTIONS = { type: argon2.argon2id, memoryCost: 19 * 1024, timeCost: 2, parallelism: 1 } as const

export const hashPassword = (password: string): Promise<string> => argon2.hash(password, OPTIONS)

let nobody: Promise<string> | undefined

/** Takes the same time whether there is a hash to compare with or not. */
export async function verifyPassword(hash: string | null, password: string): Promise<boolean> {
  nobody ??= hashPassword('nobody has this password')
  const matches = await argon2.verify(hash ?? (await nobody), password)
  return hash !== null && matches
}
