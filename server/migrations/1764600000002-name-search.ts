import type { MigrationInterface, QueryRunner } from 'typeorm'

/**
 * What the name search needs beside the trigram indexes: an index for the first letters of a name, and the names similar to
 * some words from a given likeness on. The likeness of the index operator is a setting; the function sets it for itself only.
 */
export class NameSearch1764600000002 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(`
      create index species_name_prefix_idx on species_name (normalised_name text_pattern_ops);

      create function find_similar_names(words text, likeness real) returns setof species_name
      language plpgsql stable strict set pg_trgm.word_similarity_threshold = 0.6 as $$
      begin
        perform set_config('pg_trgm.word_similarity_threshold', likeness::text, true);
        return query select n.* from species_name n where words <% n.normalised_name;
      end $$;
    `)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query('drop function find_similar_names; drop index species_name_prefix_idx')
  }
}
