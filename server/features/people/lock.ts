import type { EntityManager } from 'typeorm'

/**
 * Makes changes to one athlete's soreness and swaps wait for each other until the transaction ends. Weak enough that
 * rows which merely refer to the athlete can still be written.
 */
export async function lockAthlete(manager: EntityManager, athleteId: string): Promise<void> {
  await manager.query('select 1 from users where id = $1 for no key update', [athleteId])
}
