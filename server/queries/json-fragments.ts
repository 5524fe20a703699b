/** An SQL expression: a time as ISO 8601 in UTC with milliseconds. */
export function toIsoTime(column: string): string {
  return `to_char(${column} at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"')`
}

/** An SQL expression: a row of `revision` as a mark on the revision line. */
export function toRevisionMark(revision: string): string {
  return `json_build_object(
    'id', ${revision}.id,
    'number', ${revision}.number,
    'publishedAt', ${toIsoTime(`${revision}.published_at`)},
    'summary', ${revision}.summary,
    'broughtBy', case ${revision}.brought_by when 'dataset' then (
      select json_build_object('form', 'dataset', 'datasetId', dataset.id, 'title', dataset.title, 'version', bringing.version)
      from dataset_version bringing join dataset on dataset.id = bringing.dataset_id
      where bringing.id = ${revision}.dataset_version_id
    ) else json_build_object('form', ${revision}.brought_by) end
  )`
}

/** An SQL expression: a row of `source` with its current `source_revision` as a page shows it. */
export function toSourceBrief(source: string, revision: string): string {
  return `json_build_object('id', ${source}.id, 'kind', ${source}.kind, 'doi', ${source}.doi, 'csl', ${revision}.csl,
    'asPrinted', ${source}.as_printed, 'isInvented', ${source}.is_invented)`
}

/** An SQL expression: a row of `dataset` with one of its `dataset_version` as a page shows it. */
export function toDatasetBrief(dataset: string, version: string): string {
  return `json_build_object('id', ${dataset}.id, 'title', ${dataset}.title, 'version', ${version}.version, 'doi', ${dataset}.doi,
    'licence', ${dataset}.licence, 'licenceUrl', ${dataset}.licence_url, 'attribution', ${dataset}.attribution)`
}

/** SQL fields: how a listing names a page. */
export function toPageRef(species: string): string {
  return `'slug', ${species}.slug, 'scientificName', ${species}.scientific_name, 'isInvented', ${species}.is_invented`
}

/**
 * An SQL expression: the sources of an array of ids, as one object by the id that is cited. A merged source is its heir, so that
 * a row is looked up by what it cites and studies are counted by what they are.
 */
export function toSourcesById(ids: string): string {
  return `coalesce((
    select json_object_agg(source.id, ${toSourceBrief('heir', 'heir_revision')})
    from source
    join source heir on heir.id = coalesce(source.merged_into_id, source.id)
    join source_revision heir_revision on heir_revision.id = heir.current_source_revision_id
    where source.id = any(${ids})
  ), '{}')`
}
