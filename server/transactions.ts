import type { EntityManager } from 'typeorm'

/** Throws where a function that must happen whole or not at all was handed a manager without a transaction. */
export function requireTransaction(db: EntityManager, functionName: string): void {
  if (db.queryRunner?.isTransactionActive !== true) throw new Error(`${functionName} needs a transaction`)
}
