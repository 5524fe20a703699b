import type { MigrationInterface, QueryRunner } from 'typeorm'

const EXTENSIONS = `
create extension if not exists pg_trgm;
create extension if not exists unaccent;
create extension if not exists btree_gist;

create function normalise_name(name text) returns text language sql stable strict parallel safe
return lower(unaccent(regexp_replace(btrim(name), '\\s+', ' ', 'g')));
`

const DATASETS_AND_SOURCES = `
create table dataset (
  id text primary key,
  title text not null,
  doi text,
  licence text not null,
  licence_url text,
  attribution text not null
);

create table dataset_version (
  id uuid primary key default gen_random_uuid(),
  dataset_id text not null references dataset,
  version text not null,
  file_sha256 bytea not null,
  imported_at timestamptz not null,
  rows_read int not null,
  rows_accepted int not null,
  rows_merged int not null,
  rows_rejected int not null,
  rejected jsonb not null,
  unique (dataset_id, file_sha256)
);

create table source (
  id uuid primary key default gen_random_uuid(),
  doi text,
  reference_key bytea,
  kind text not null,
  terms text,
  as_printed text,
  is_invented boolean not null,
  merged_into_id uuid references source,
  current_source_revision_id uuid,
  listing text not null,
  constraint source_doi_check check (doi = lower(doi))
);
create unique index source_doi_idx on source (doi);
create unique index source_reference_key_idx on source (reference_key);
create index source_merged_into_id_idx on source (merged_into_id);
create index source_current_source_revision_id_idx on source (current_source_revision_id);
create index source_listing_idx on source (listing, id) where merged_into_id is null;
create index source_listing_words_idx on source using gin (listing gin_trgm_ops) where merged_into_id is null;

create table source_revision (
  id uuid primary key default gen_random_uuid(),
  source_id uuid not null references source,
  number int not null,
  csl jsonb not null,
  published_at timestamptz not null,
  brought_by text not null,
  dataset_version_id uuid references dataset_version,
  unique (source_id, number)
);
create index source_revision_dataset_version_id_idx on source_revision (dataset_version_id);
alter table source add foreign key (current_source_revision_id) references source_revision;
`

const PAGES_AND_REVISIONS = `
create table species (
  id uuid primary key default gen_random_uuid(),
  slug text not null,
  is_invented boolean not null,
  current_revision_id uuid,
  revision_number int not null,
  updated_at timestamptz not null,
  scientific_name text not null,
  common_names text[] not null,
  class text not null,
  "order" text,
  family text,
  conservation text,
  range_count int not null,
  physiology_count int not null,
  uv_zone smallint,
  evidence_kinds text[] not null,
  search text not null
);
create unique index species_slug_idx on species (slug);
create index species_is_invented_idx on species (is_invented);
create index species_current_revision_id_idx on species (current_revision_id);
create index species_scientific_name_idx on species (scientific_name);
create index species_class_idx on species (class);
create index species_order_idx on species ("order");
create index species_family_idx on species (family);
create index species_conservation_idx on species (conservation);
create index species_uv_zone_idx on species (uv_zone);
create index species_evidence_kinds_idx on species using gin (evidence_kinds);
create index species_search_idx on species using gin (search gin_trgm_ops);
-- Listings put pages with ranges first.
create index species_listing_idx on species ((range_count > 0) desc, scientific_name, id);
create index species_newest_idx on species (updated_at desc, id);
create index species_wanting_idx on species (physiology_count desc, id) where range_count = 0 and not is_invented;

create table species_slug (
  slug text primary key,
  species_id uuid not null references species
);
create index species_slug_species_id_idx on species_slug (species_id);

create table revision (
  id uuid primary key default gen_random_uuid(),
  species_id uuid not null references species,
  number int not null,
  published_at timestamptz not null,
  summary text not null,
  base_revision_id uuid references revision,
  restores_revision_id uuid references revision,
  brought_by text not null,
  dataset_version_id uuid references dataset_version,
  unique (species_id, number)
);
create index revision_base_revision_id_idx on revision (base_revision_id);
create index revision_restores_revision_id_idx on revision (restores_revision_id);
create index revision_dataset_version_id_idx on revision (dataset_version_id);
alter table species add foreign key (current_revision_id) references revision;

create table revision_item (
  revision_id uuid references revision,
  item_id uuid,
  kind text not null,
  parent_item_id uuid,
  ordinal int not null,
  row_hash bytea not null,
  primary key (revision_id, item_id)
);
create index revision_item_row_hash_idx on revision_item (row_hash);
create index revision_item_item_id_row_hash_idx on revision_item (item_id, row_hash);
`

const ROWS = `
create table range_row (
  hash bytea primary key,
  parameter text not null,
  position text not null,
  period text not null,
  season text not null,
  life_stage text not null,
  low double precision,
  high double precision,
  lower_limit double precision,
  upper_limit double precision,
  typed_unit text not null,
  has_typed boolean not null,
  typed_low text,
  typed_high text,
  typed_lower_limit text,
  typed_upper_limit text,
  uv_meaning text,
  uv_zone smallint,
  note text
);

create table evidence_row (
  hash bytea primary key,
  source_id uuid not null references source,
  kind text not null,
  locator text,
  statement text not null,
  printed_low text,
  printed_high text,
  printed_mean text,
  printed_sd text,
  printed_unit text not null,
  low double precision,
  high double precision,
  mean double precision,
  sd double precision,
  n bigint,
  note text
);
create index evidence_row_source_id_idx on evidence_row (source_id);

create table record_set (
  hash bytea primary key,
  dataset_id text not null references dataset,
  dataset_version_id uuid not null references dataset_version,
  record_count int not null,
  studies jsonb not null,
  quantities text[] not null,
  source_ids uuid[] not null
);
create index record_set_dataset_id_idx on record_set (dataset_id);
create index record_set_dataset_version_id_idx on record_set (dataset_version_id);

create table physiology_record (
  set_hash bytea references record_set,
  ordinal int,
  record_id text not null,
  name_as_printed text not null,
  quantity text not null,
  lethal_percent smallint,
  life_stage text not null,
  mean_c double precision,
  low_c double precision,
  high_c double precision,
  sd_c double precision,
  se_c double precision,
  n bigint,
  level text not null,
  source_id uuid references source,
  source_as_printed text not null,
  facts jsonb not null,
  primary key (set_hash, ordinal)
);
create index physiology_record_record_id_idx on physiology_record (record_id);
create index physiology_record_source_id_idx on physiology_record (source_id);

create table physiology_row (
  hash bytea primary key,
  form text not null,
  dataset_id text references dataset,
  record_set_hash bytea references record_set,
  quantity text,
  life_stage text,
  source_id uuid references source,
  locator text,
  printed_low text,
  printed_high text,
  printed_mean text,
  printed_sd text,
  printed_unit text,
  mean_c double precision,
  low_c double precision,
  high_c double precision,
  sd_c double precision,
  n bigint,
  note text,
  constraint physiology_row_form_check check (
    (form = 'dataset' and dataset_id is not null and record_set_hash is not null) or
    (form = 'cited' and quantity is not null and life_stage is not null and source_id is not null and printed_unit is not null)
  )
);
create index physiology_row_dataset_id_idx on physiology_row (dataset_id);
create index physiology_row_record_set_hash_idx on physiology_row (record_set_hash);
create index physiology_row_source_id_idx on physiology_row (source_id);

create table name_row (
  hash bytea primary key,
  kind text not null,
  name text not null,
  authority text,
  status text,
  language text,
  provenance text not null
);

create table classification_row (
  hash bytea primary key,
  class text not null,
  "order" text,
  suborder text,
  family text,
  conservation text,
  active_time text,
  microhabitat text,
  region text,
  provenance text not null
);

create table prose_row (
  hash bytea primary key,
  heading text not null,
  markdown text not null,
  source_ids uuid[] not null
);

create table image_row (
  hash bytea primary key,
  media_id uuid not null,
  alternative_text text not null,
  caption text,
  licence text not null,
  credit text not null
);
create index image_row_media_id_idx on image_row (media_id);
`

const PROJECTIONS = `
create table species_name (
  species_id uuid references species,
  item_id uuid,
  kind text not null,
  name text not null,
  normalised_name text not null,
  language text,
  ordinal int not null,
  primary key (species_id, item_id)
);
create index species_name_normalised_name_idx on species_name using gin (normalised_name gin_trgm_ops);

create table current_range (
  species_id uuid references species,
  item_id uuid,
  position text,
  period text,
  parameter text not null,
  stated_position text not null,
  stated_period text not null,
  season text not null,
  life_stage text not null,
  uv_meaning text,
  low double precision,
  high double precision,
  lower_limit double precision,
  upper_limit double precision,
  span numrange,
  primary key (species_id, item_id, position, period)
);
create index current_range_species_idx on current_range (species_id, parameter, position, period);
create index current_range_span_idx on current_range using gist (parameter, position, period, span);

create table current_citation (
  source_id uuid references source,
  species_id uuid references species,
  scientific_name text not null,
  ranges int not null,
  physiology int not null,
  primary key (source_id, species_id)
);
create index current_citation_species_id_idx on current_citation (species_id);
create index current_citation_listing_idx on current_citation (source_id, scientific_name, species_id);
`

const SITE = `
create table site_epoch (
  id boolean primary key,
  number bigint not null,
  transaction_id text not null,
  constraint site_epoch_id_check check (id)
);
insert into site_epoch (id, number, transaction_id) values (true, 1, '');

create table page_request (
  normalised_name text primary key,
  name text not null,
  times int not null,
  first_asked_at timestamptz not null,
  last_asked_at timestamptz not null
);
create index page_request_times_normalised_name_idx on page_request (times, normalised_name);
`

/** What is published stays as it was published, whoever holds the connection. */
const IMMUTABLE_TABLES = [
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
]

const IMMUTABILITY = `
create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception 'rows of % are never changed or deleted', tg_table_name using errcode = 'restrict_violation';
end $$;
${IMMUTABLE_TABLES.map(
  (table) => `create trigger ${table}_is_immutable before update or delete on ${table}
  for each row execute function refuse_change();`,
).join('\n')}
`

/** Species pages, their revisions and rows, sources, datasets, and the projections that screens read. */
export class GroundFloor1764600000000 implements MigrationInterface {
  async up(db: QueryRunner): Promise<void> {
    await db.query(EXTENSIONS)
    await db.query(DATASETS_AND_SOURCES)
    await db.query(PAGES_AND_REVISIONS)
    await db.query(ROWS)
    await db.query(PROJECTIONS)
    await db.query(SITE)
    await db.query(IMMUTABILITY)
  }

  async down(db: QueryRunner): Promise<void> {
    await db.query(`
      drop table page_request, site_epoch, current_citation, current_range, species_name, image_row, prose_row,
        classification_row, name_row, physiology_row, physiology_record, record_set, evidence_row, range_row,
        revision_item, revision, species_slug, species, source_revision, source, dataset_version, dataset cascade;
      drop function refuse_change, normalise_name;
    `)
  }
}
