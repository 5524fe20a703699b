import type { EntityManager } from 'typeorm'

/** The role the server signs in with. It reads everything, and writes only what is listed here. */
const APPLICATION_ROLE = 'mossgauge_app'

/** What is published is only ever added to. */
const APPEND_ONLY = [
  'revision',
  'revision_item',
  'source_revision',
  'range_row',
  'evidence_row',
  'physiology_row',
  'name_row',
  'classification_row',
  'prose_row',
  'image_row',
  'record_set',
  'physiology_record',
  'species_slug',
]
const CHANGING = ['species', 'source', 'dataset', 'dataset_version', 'page_request']
const PROJECTIONS = ['species_name', 'current_page', 'current_range', 'current_citation']

/** Gives the application role its rights, newly after each migration. Does nothing where that role does not exist. */
export async function grantApplicationRole(db: EntityManager): Promise<void> {
  const roles: unknown[] = await db.query('select 1 from pg_roles where rolname = $1', [APPLICATION_ROLE])
  if (roles.length === 0) return
  await db.query(`
    grant usage on schema public to ${APPLICATION_ROLE};
    revoke all on all tables in schema public from ${APPLICATION_ROLE};
    grant select on all tables in schema public to ${APPLICATION_ROLE};
    grant insert on ${APPEND_ONLY.join(', ')} to ${APPLICATION_ROLE};
    grant insert, update on ${CHANGING.join(', ')} to ${APPLICATION_ROLE};
    grant insert, delete on ${PROJECTIONS.join(', ')} to ${APPLICATION_ROLE};
    grant update on site_epoch to ${APPLICATION_ROLE};
    grant insert, update, delete on rate_limit to ${APPLICATION_ROLE};
  `)
}
