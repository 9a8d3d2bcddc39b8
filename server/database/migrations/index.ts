import { People1764600000000 } from './1764600000000-people'

/**
 * Every migration in order. File and class carry the same 13-digit time: `1764600000000-people.ts` exports
 * `People1764600000000`. Draft one with `npx tsx server/scripts/draft-migration.ts` on a migrated database.
 */
export const migrations = [People1764600000000]
