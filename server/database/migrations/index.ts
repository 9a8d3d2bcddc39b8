import { People1764600000000 } from './1764600000000-people'
import { Exercises1764610000000 } from './1764610000000-exercises'
import { Places1764610100000 } from './1764610100000-places'
import { Sessions1764610200000 } from './1764610200000-sessions'
import { SoreJoints1764610300000 } from './1764610300000-sore-joints'
import { Swaps1764610400000 } from './1764610400000-swaps'
import { Flags1764610500000 } from './1764610500000-flags'
import { UsualPlaces1764620000000 } from './1764620000000-usual-places'

/**
 * Every migration in order. File and class carry the same 13-digit time: `1764600000000-people.ts` exports
 * `People1764600000000`. Draft one with `npx tsx server/scripts/draft-migration.ts` on a migrated database.
 */
export const migrations = [
  People1764600000000,
  Exercises1764610000000,
  Places1764610100000,
  Sessions1764610200000,
  SoreJoints1764610300000,
  Swaps1764610400000,
  Flags1764610500000,
  UsualPlaces1764620000000,
]
