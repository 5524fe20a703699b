import type { EntityManager } from 'typeorm'
import { datasets } from './datasets/all.js'
import { importDataset, type ImportReport } from './importing/import-dataset.js'

/** A few real species that show every form a page of real data takes. */
const smallSelection: ReadonlySet<string> = new Set([
  'Acris crepitans',
  'Agama agama',
  'Anaxyrus americanus',
  'Anolis carolinensis',
  'Bufo boreas',
  'Cataglyphis bicolor',
  'Crocodylus porosus',
  'Desmognathus fuscus',
  'Dipsosaurus dorsalis',
  'Eublepharis macularius',
  'Hyla cinerea',
  'Iguana iguana',
  'Incilius alvarius',
  'Misumenoides formosipes',
  'Orchesella cincta',
  'Phrynosoma cornutum',
  'Podarcis muralis',
  'Pogona vitticeps',
  'Rana catesbeiana',
  'Rana sylvatica',
  'Rana temporaria',
  'Rhinella marina',
  'Sceloporus occidentalis',
  'Sphenodon punctatus',
  'Thamnophis sirtalis',
  'Tiliqua rugosa',
  'Trachemys scripta',
  'Uta stansburiana',
  'Varanus varius',
  'Xenopus laevis',
  'Zootoca vivipara',
])

/** What loading the real species needs besides the database. */
export interface LoadOptions {
  importedAt: Date
  say?: (line: string) => void
  /** Called after each dataset. */
  onImported?: (report: ImportReport) => Promise<void> | void
}

/** Imports every dataset in its order, each in a transaction of its own; what is there already stays as it is. */
export async function loadRealSpecies(db: EntityManager, options: LoadOptions): Promise<ImportReport[]> {
  return loadDatasets(db, options)
}

/** Imports some thirty real species by the same way from the same files. */
export async function loadSmallRealSpecies(db: EntityManager, options: LoadOptions): Promise<ImportReport[]> {
  return loadDatasets(db, options, smallSelection)
}

async function loadDatasets(
  db: EntityManager,
  { importedAt, say, onImported }: LoadOptions,
  onlyPages?: ReadonlySet<string>,
): Promise<ImportReport[]> {
  const reports: ImportReport[] = []
  for (const definition of datasets) {
    const report = await importDataset(db, definition, {
      importedAt,
      ...(say && { say }),
      ...(onlyPages && { onlyPages }),
    })
    reports.push(report)
    await onImported?.(report)
  }
  return reports
}
