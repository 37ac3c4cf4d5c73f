import { compareBars, type BarPrices, type ComparedBars } from '@/server/prices/compare-bars';
import { findSuspects } from '@/server/prices/find-suspects';
import { type PriceFileContent } from '@/server/prices/reading/interpret-table';
import { type RefusedRow } from '@/server/prices/reading/read-bars';
import { type PriceUpload } from '@/shared/prices/price-upload';

const sampledBars = 5;
/** So many refused rows, changes or suspects are named; a count stands for the rest, so that an answer stays small. */
const namedRows = 500;

function namedRefusals(refused: readonly RefusedRow[]): RefusedRow[] {
  const named = refused.slice(0, namedRows);
  const next = refused[namedRows];
  if (next === undefined) return named;
  const left = refused.length - namedRows;
  return [
    ...named,
    { row: next.row, text: '', column: '', message: `${left} more rows cannot be taken, from row ${next.row} on.` },
  ];
}

export interface PreviewedFile {
  readonly preview: PriceUpload;
  readonly compared: ComparedBars;
}

/** What storing the file would do to the bars a desk keeps. */
export function buildPreview({
  upload,
  content,
  stored,
}: {
  upload: Pick<PriceUpload, 'id' | 'underlyingId' | 'fileName'>;
  content: PriceFileContent;
  stored: ReadonlyMap<string, BarPrices>;
}): PreviewedFile {
  const bars = [...content.bars].sort((a, b) => a.sessionDate.localeCompare(b.sessionDate));
  const compared = compareBars(bars, stored);
  const storedCloses = new Map([...stored].map(([sessionDate, { close }]) => [sessionDate, close]));
  const isShort = bars.length <= 2 * sampledBars;
  const preview: PriceUpload = {
    ...upload,
    state: 'preview',
    sheets: [...content.sheets],
    headers: content.headers,
    reading: content.reading,
    questions: content.questions,
    rowsRead: content.rowsRead,
    added: compared.added,
    unchanged: compared.unchanged,
    changes: compared.changes,
    refused: namedRefusals(content.refused),
    suspects: findSuspects(bars, storedCloses).slice(0, namedRows),
    firstSessionDate: bars[0]?.sessionDate ?? null,
    lastSessionDate: bars.at(-1)?.sessionDate ?? null,
    sample: isShort ? bars : [...bars.slice(0, sampledBars), ...bars.slice(-sampledBars)],
    canCommit: content.questions.length === 0 && content.refused.length === 0 && bars.length > 0,
  };
  return { preview, compared };
}
