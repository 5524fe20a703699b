import type { EntityManager } from 'typeorm'
import type { Attributions } from '../../shared/home.js'
import { queryPrepared } from '../prepared.js'
import { toDatasetBrief, toIsoTime } from './json-fragments.js'

// There are as many datasets as somebody wrote an importer for, so this list alone is not paged.
const FIND_ATTRIBUTIONS = {
  name: 'find-attributions',
  text: `
    select coalesce(json_agg(json_build_object(
      'dataset', ${toDatasetBrief('dataset', 'version')},
      'importedAt', ${toIsoTime('version.imported_at')},
      'rowsRead', version.rows_read,
      'rowsAccepted', version.rows_accepted,
      'rowsMerged', version.rows_merged,
      'rowsRejected', version.rows_rejected,
      'pages', coalesce(brought.pages, 0)
    ) order by dataset.title, dataset.id), '[]') as datasets
    from dataset
    join lateral (
      select * from dataset_version where dataset_version.dataset_id = dataset.id order by imported_at desc, id limit 1
    ) version on true
    left join (
      select dataset_version.dataset_id, count(distinct revision.species_id)::int as pages
      from revision join dataset_version on dataset_version.id = revision.dataset_version_id
      group by dataset_version.dataset_id
    ) brought on brought.dataset_id = dataset.id`,
}

/** The datasets whose rows stand on pages, with their licences, the account of the newest import, and how many pages each changed. */
export async function findAttributions(db: EntityManager): Promise<Attributions> {
  const [found] = await queryPrepared<Attributions>(db, FIND_ATTRIBUTIONS, [])
  return { datasets: found?.datasets ?? [] }
}
