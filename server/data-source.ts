import { DataSource } from 'typeorm'
import { ClassificationRow } from './entities/ClassificationRow.js'
import { CurrentCitation } from './entities/CurrentCitation.js'
import { CurrentPage } from './entities/CurrentPage.js'
import { CurrentRange } from './entities/CurrentRange.js'
import { Dataset } from './entities/Dataset.js'
import { DatasetVersion } from './entities/DatasetVersion.js'
import { EvidenceRow } from './entities/EvidenceRow.js'
import { ImageRow } from './entities/ImageRow.js'
import { NameRow } from './entities/NameRow.js'
import { PageRequest } from './entities/PageRequest.js'
import { PhysiologyRecord } from './entities/PhysiologyRecord.js'
import { PhysiologyRow } from './entities/PhysiologyRow.js'
import { ProseRow } from './entities/ProseRow.js'
import { RangeRow } from './entities/RangeRow.js'
import { RecordSet } from './entities/RecordSet.js'
import { Revision } from './entities/Revision.js'
import { RevisionItem } from './entities/RevisionItem.js'
import { SiteEpoch } from './entities/SiteEpoch.js'
import { Source } from './entities/Source.js'
import { SourceRevision } from './entities/SourceRevision.js'
import { Species } from './entities/Species.js'
import { SpeciesName } from './entities/SpeciesName.js'
import { SpeciesSlug } from './entities/SpeciesSlug.js'
import { GroundFloor1764600000000 } from './migrations/1764600000000-ground-floor.js'
import { RateLimit1764600000001 } from './migrations/1764600000001-rate-limit.js'
import { NameSearch1764600000002 } from './migrations/1764600000002-name-search.js'
import { CurrentPage1764600000003 } from './migrations/1764600000003-current-page.js'
import { EpochAtCommit1764600000004 } from './migrations/1764600000004-epoch-at-commit.js'
import { PostgresNaming } from './postgres-naming.js'

/** A data source for a PostgreSQL address, not yet connected; call `initialize()`, and `destroy()` when done. */
export function createDataSource(url: string, options: { poolSize?: number } = {}): DataSource {
  return new DataSource({
    type: 'postgres',
    url,
    poolSize: options.poolSize ?? 10,
    applicationName: 'mossgauge',
    namingStrategy: new PostgresNaming(),
    // The defaults would create an extension at connect, which the application role may not.
    installExtensions: false,
    uuidExtension: 'pgcrypto',
    synchronize: false,
    entities: [
      ClassificationRow,
      CurrentCitation,
      CurrentPage,
      CurrentRange,
      Dataset,
      DatasetVersion,
      EvidenceRow,
      ImageRow,
      NameRow,
      PageRequest,
      PhysiologyRecord,
      PhysiologyRow,
      ProseRow,
      RangeRow,
      RecordSet,
      Revision,
      RevisionItem,
      SiteEpoch,
      Source,
      SourceRevision,
      Species,
      SpeciesName,
      SpeciesSlug,
    ],
    migrations: [
      GroundFloor1764600000000,
      RateLimit1764600000001,
      NameSearch1764600000002,
      CurrentPage1764600000003,
      EpochAtCommit1764600000004,
    ],
    migrationsTableName: 'migration',
  })
}
