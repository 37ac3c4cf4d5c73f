import { detectFileKind } from '@/server/prices/reading/file-kind';
import { interpretTable, type PriceFileContent, type SettledReading } from '@/server/prices/reading/interpret-table';
import { PriceFileError } from '@/server/prices/reading/price-file-error';
import { readTextTable } from '@/server/prices/reading/read-text-table';
import { readWorkbookTable } from '@/server/prices/reading/read-workbook-table';
import { readingLimits } from '@/server/prices/reading/reading-limits';
import { type Reading } from '@/shared/prices/price-upload';

export interface PriceFileRequest {
  readonly bytes: Uint8Array;
  readonly fileName: string;
  /** How the person wants it read; null to find out. */
  readonly wanted: Reading | null;
  /** The reading they were shown before. */
  readonly shown: SettledReading | null;
  /** Instant. */
  readonly now: string;
}

/** Reads a price file from its bytes alone. @throws {PriceFileError} when the file as a whole cannot be read. */
export async function readPriceFile({
  bytes,
  fileName,
  wanted,
  shown,
  now,
}: PriceFileRequest): Promise<PriceFileContent> {
  if (bytes.length > readingLimits.bytes) {
    throw new PriceFileError(
      'too-large',
      `The file is larger than ${readingLimits.bytes / 1024 / 1024} MB. Split it by years.`,
    );
  }
  const kind = detectFileKind(bytes, fileName);
  const table =
    kind === 'text' ? readTextTable(bytes) : await readWorkbookTable(Buffer.from(bytes), wanted?.sheet ?? null);
  return interpretTable(table, { wanted, shown, now });
}
