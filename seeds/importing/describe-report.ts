import type { ImportReport } from './import-dataset.js'

/** The account of an import in lines for the person who started it. */
export function describeReport(report: ImportReport): string[] {
  const { datasetId, version, rejected, leftOut } = report
  if (report.isKnown) return [`${datasetId} (${version}): this file is imported already; nothing changed.`]
  return [
    `${datasetId} (${version}): ${report.rowsRead} rows read, ${report.rowsAccepted} accepted ` +
      `(${report.rowsMerged} of them under the accepted name), ${rejected.length} rejected, ` +
      `${leftOut.reduce((sum, { rows }) => sum + rows, 0)} left out.`,
    `  ${report.pages} species: ${report.pagesNew} new pages, ${report.pagesChanged} changed.`,
    ...(report.citationKeys > 0
      ? [`  ${report.citationKeysResolved} of ${report.citationKeys} author-year citations resolved.`]
      : []),
    ...leftOut.map(({ reason, rows }) => `  ${rows} rows left out: ${reason}.`),
    ...rejected.map(({ line, reason }) => `  Line ${line} rejected: ${reason}`),
  ]
}
