import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * Counters of the rate limits, in the form the limiter's package expects. Not logged: after a crash of the database the
 * counts begin anew, and nothing else is lost.
 */
export class RateLimit1764600000001 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      create unlogged table rate_limit (
        key varchar(255) primary key,
        points integer not null default 0,
        expire bigint
      );
      create index rate_limit_expire_idx on rate_limit (expire);
    `)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('drop table rate_limit')
  }
}
