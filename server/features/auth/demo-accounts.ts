import type { DemoAccount } from '#shared/contract/auth'
import { DEMO_ACCOUNTS } from '../../../seeds/demo/people'
import type { Env } from '../../env'

/** Accounts that anybody may know, or none when these people are not in the database. */
export const demoAccounts = (env: Pick<Env, 'PINTLE_DEMO'>): DemoAccount[] => (env.PINTLE_DEMO ? DEMO_ACCOUNTS : [])
