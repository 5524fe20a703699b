import pg from 'pg'

const ITEMS = 40

const INSERT_REVISIONS = `
  insert into revision (id, species_id, number, published_at, summary, base_revision_id, brought_by)
  select md5($1::text || ' ' || number)::uuid, $1::uuid, number, timestamptz '2026-03-01' + number * interval '1 hour',
    'Invented revision number ' || number || ', which changes one of the ranges',
    case when number > 1 then md5($1::text || ' ' || (number - 1))::uuid end, 'demonstration'
  from generate_series(1, $2::int) number`

const INSERT_ITEMS = `
  insert into revision_item (revision_id, item_id, kind, ordinal, row_hash)
  select revision.id, md5($1::text || ' item ' || ordinal)::uuid, 'range', ordinal, sha256(('row ' || ordinal)::bytea)
  from revision cross join generate_series(1, $2::int) ordinal
  where revision.species_id = $1::uuid`

const POINT_PAGE = `
  update species set revision_number = $2::int, current_revision_id = md5($1::text || ' ' || $2::int)::uuid
  where id = $1::uuid`

/** Gives the page of a slug so many revisions of forty items. */
export async function fillWithRevisions(ownerUrl: string, slug: string, revisions: number): Promise<void> {
  const owner = new pg.Client({ connectionString: ownerUrl })
  await owner.connect()
  try {
    const found = await owner.query<{ id: string }>('select id from species where slug = $1', [slug])
    const id = found.rows[0]?.id
    await owner.query(INSERT_REVISIONS, [id, revisions])
    await owner.query(INSERT_ITEMS, [id, ITEMS])
    await owner.query(POINT_PAGE, [id, revisions])
    await owner.query('analyze revision, revision_item')
  } finally {
    await owner.end()
  }
}
