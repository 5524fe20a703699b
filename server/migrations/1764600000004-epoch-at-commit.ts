import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * The epoch of the public pages moves by itself, in the last moment of a transaction. Were it moved at once, a long import would
 * hold its row to the end, everybody else's publishing would wait for it, and two that hold a page each could wait for one another.
 */
export class EpochAtCommit1764600000004 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      create function move_site_epoch() returns trigger language plpgsql as $$
      declare moved bigint;
      begin
        update site_epoch set number = number + 1, transaction_id = pg_current_xact_id()::text
        where transaction_id <> pg_current_xact_id()::text
        returning number into moved;
        if moved is not null then perform pg_notify('site_epoch', moved::text); end if;
        return null;
      end $$;

      create constraint trigger revision_moves_site_epoch after insert on revision
      deferrable initially deferred for each row execute function move_site_epoch();

      create constraint trigger source_moves_site_epoch after insert or update on source
      deferrable initially deferred for each row execute function move_site_epoch();

      create constraint trigger dataset_version_moves_site_epoch after insert or update on dataset_version
      deferrable initially deferred for each row execute function move_site_epoch();
    `)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(`
      drop trigger dataset_version_moves_site_epoch on dataset_version;
      drop trigger source_moves_site_epoch on source;
      drop trigger revision_moves_site_epoch on revision;
      drop function move_site_epoch;
    `)
  }
}
