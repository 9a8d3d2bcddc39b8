import type { DemoAccount } from '#shared/contract/auth'
import { ATHLETES, DEMO_ACCOUNTS, STAFF } from '../../../seeds/demo/people'
import type { Env } from '../../env'

/** Accounts that anybody may know, or none when these people are not in the database. */
export const demoAccounts = (env: Pick<Env, 'PINTLE_DEMO'>): DemoAccount[] => (env.PINTLE_DEMO ? DEMO_ACCOUNTS : [])

const ADDRESSES: ReadonlySet<string> = new Set([...ATHLETES, ...STAFF].map(({ email }) => email))

/** An address of a demo person. No real mailbox can have one: the domain is reserved for examples. */
export const isDemoAddress = (email: string): boolean => ADDRESSES.has(email.toLowerCase())
