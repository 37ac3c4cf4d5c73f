import { cashFlows } from '@/journal/fills/cash-flow';
import { type DeskScope } from '@/server/database/desk-scope';
import { type EntryDescriber } from '@/server/entries/describe-entry';
import { entryColumns } from '@/server/exports/entry-columns';
import { entryPages, type ExportedEntry } from '@/server/exports/entry-pages';
import { type ExportTable, exportTable } from '@/server/exports/export-column';
import { type ExportedFill, fillColumns } from '@/server/exports/fill-columns';
import { forecastColumns } from '@/server/exports/forecast-columns';
import { oddsColumns } from '@/server/exports/odds-columns';
import { outcomeColumns } from '@/server/exports/outcome-columns';
import { writeCsv } from '@/server/exports/write-csv';
import { writeJson } from '@/server/exports/write-json';
import { writeWorkbook } from '@/server/exports/write-workbook';
import { FillStore } from '@/server/fills/fill-store';
import { OutcomeEntity } from '@/server/outcomes/outcome-entity';
import { ScoredOddsEntity } from '@/server/outcomes/scored-odds-entity';
import { type Clock } from '@/server/runtime/clock';
import { SealStore } from '@/server/seals/seal-store';
import { type StreamedFile } from '@/shared/contract/define-endpoint';
import { type ExportQuery, type ExportTableName } from '@/shared/exports/export-endpoints';

/** The journal as a file, written while it is read. */
export class ExportService {
  constructor(private readonly dependencies: { readonly describer: EntryDescriber; readonly clock: Clock }) {}

  journal(scope: DeskScope, query: ExportQuery): StreamedFile {
    const now = this.dependencies.clock.now();
    const tables = journalTables(scope, () => entryPages(scope, this.dependencies.describer, query));
    const name = `journal-${now.toISOString().slice(0, 10)}`;
    if (query.format === 'csv') {
      return {
        fileName: `${name}-${query.table}.csv`,
        contentType: 'text/csv; charset=utf-8',
        pieces: writeCsv(tables[query.table]),
      };
    }
    const all = Object.values(tables);
    return query.format === 'json'
      ? { fileName: `${name}.json`, contentType: 'application/json; charset=utf-8', pieces: writeJson(all, now) }
      : {
          fileName: `${name}.xlsx`,
          contentType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
          pieces: writeWorkbook(all),
        };
  }
}

type Pages = () => AsyncGenerator<readonly ExportedEntry[]>;

function journalTables(scope: DeskScope, pages: Pages): Readonly<Record<ExportTableName, ExportTable>> {
  /** Rows that hang on the entries of each page, read for a page at once. */
  const hanging = <Row>(read: (entries: readonly ExportedEntry[]) => Promise<readonly Row[]>) =>
    async function* () {
      for await (const page of pages()) yield await read(page);
    };
  return {
    entries: exportTable('entries', entryColumns, pages),
    forecasts: exportTable(
      'forecasts',
      forecastColumns,
      hanging(async (entries) => {
        const seals = await new SealStore(scope).findByEntries(idsOf(entries));
        return entries.flatMap(({ row }) => {
          const seal = seals.get(row.id);
          return seal === undefined ? [] : [{ row, seal }];
        });
      }),
    ),
    odds: exportTable(
      'odds',
      oddsColumns,
      hanging(async (entries) => {
        const odds = await scope
          .repository(ScoredOddsEntity)
          .query('odds')
          .andWhere('odds.entryId IN (:...ids)', { ids: idsOf(entries) })
          .orderBy('odds.entryId', 'DESC') // as the entries come
          .addOrderBy('odds.oddsKey')
          .getMany();
        const rows = new Map(entries.map(({ row }) => [row.id, row]));
        return odds.flatMap((one) => {
          const row = rows.get(one.entryId);
          return row === undefined ? [] : [{ row, odds: one }];
        });
      }),
    ),
    fills: exportTable(
      'fills',
      fillColumns,
      hanging(async (entries) => {
        const fills = await new FillStore(scope).listOf(idsOf(entries));
        return entries.flatMap(({ row }): ExportedFill[] => {
          const own = fills.get(row.id) ?? [];
          const cash = cashFlows(own.map(({ fill }) => fill));
          return own.map((stored) => ({ row, stored, cash: cash.get(stored.fill.id) ?? '0' }));
        });
      }),
    ),
    outcomes: exportTable(
      'outcomes',
      outcomeColumns,
      hanging(async (entries) => {
        const outcomes = await scope
          .repository(OutcomeEntity)
          .query('outcome')
          .andWhere('outcome.entryId IN (:...ids)', { ids: idsOf(entries) })
          .getMany();
        const byEntry = new Map(outcomes.map(({ entryId, outcome }) => [entryId, outcome]));
        return entries.flatMap(({ row }) => {
          const outcome = byEntry.get(row.id);
          return outcome === undefined ? [] : [{ row, outcome }];
        });
      }),
    ),
  };
}

const idsOf = (entries: readonly ExportedEntry[]): string[] => entries.map(({ row }) => row.id);
