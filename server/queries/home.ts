import type { EntityManager } from 'typeorm'
import type { HomeAnswer } from '../../shared/home.js'
import { queryPrepared } from '../prepared.js'
import { toPageRef, toRevisionMark } from './json-fragments.js'

const RECENT_LENGTH = 8
const WANTING_LENGTH = 8

const FIND_HOME = {
  name: 'find-home',
  text: `
    select json_build_object(
      'realSpecies', counted.real_species,
      'inventedSpecies', counted.invented_species,
      'withRanges', counted.with_ranges,
      'records', counted.records,
      'sources', (select count(*) from source where merged_into_id is null and not is_invented),
      'recent', coalesce((
        select json_agg(json_build_object(${toPageRef('recent')}, 'revision', ${toRevisionMark('revision')})
          order by recent.updated_at desc, recent.id)
        from (select * from species order by updated_at desc, id limit ${RECENT_LENGTH}) recent
        join revision on revision.id = recent.current_revision_id
      ), '[]'),
      'wanting', coalesce((
        select json_agg(json_build_object(${toPageRef('wanting')}, 'physiologyCount', wanting.physiology_count)
          order by wanting.physiology_count desc, wanting.id)
        from (
          select * from species where range_count = 0 and not is_invented
          order by physiology_count desc, id limit ${WANTING_LENGTH}
        ) wanting
      ), '[]')
    ) as answer
    from (
      select
        count(*) filter (where not is_invented) as real_species,
        count(*) filter (where is_invented) as invented_species,
        count(*) filter (where range_count > 0 and not is_invented) as with_ranges,
        coalesce(sum(physiology_count) filter (where not is_invented), 0) as records
      from species
    ) counted`,
}

/** What the home page says: how much there is, what was published last, and well-studied real species that want a cited range. */
export async function findHome(db: EntityManager): Promise<HomeAnswer> {
  const [found] = await queryPrepared<{ answer: HomeAnswer }>(db, FIND_HOME, [])
  if (found === undefined) throw new Error('The home page gave no answer')
  return found.answer
}
