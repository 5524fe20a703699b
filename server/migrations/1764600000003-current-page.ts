import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * The current page as JSON, and JSON kept as it was written where it is only ever sent on. A page published before is read from
 * its rows until it is published again or the projections are rebuilt.
 */
export class CurrentPage1764600000003 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      create table current_page (
        species_id uuid primary key references species,
        revision_id uuid not null references revision,
        names json not null,
        classification json,
        ranges json not null,
        prose json not null,
        images json not null,
        source_ids uuid[] not null
      );
      create unique index current_page_revision_id_idx on current_page (revision_id);
      -- Unpacking a large page took longer than reading it.
      alter table current_page alter ranges set storage external, alter prose set storage external;

      alter table record_set alter studies type json using studies::json;
      alter table source_revision alter csl type json using csl::json;
    `)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(`
      alter table source_revision alter csl type jsonb using csl::jsonb;
      alter table record_set alter studies type jsonb using studies::jsonb;
      drop table current_page;
    `)
  }
}
