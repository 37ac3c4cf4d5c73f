import { fromBuffer, type Entry, type ZipFile } from 'yauzl';
import { PriceFileError, unreadable } from '@/server/prices/reading/price-file-error';
import { readingLimits } from '@/server/prices/reading/reading-limits';

const megabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024)} MB`;

const brokenWorkbook = () =>
  unreadable('The workbook is damaged or incomplete. Download or save it again as XLSX, then choose it again.');

const open = (bytes: Buffer): Promise<ZipFile> =>
  new Promise((resolve, reject) => {
    // Names are never used as paths, so their form does not matter; sizes that lie are refused while inflating.
    fromBuffer(bytes, { lazyEntries: true, validateEntrySizes: true }, (error, zip) => {
      if (error === null) resolve(zip);
      else reject(brokenWorkbook());
    });
  });

function refuseByName({ fileName }: Entry): void {
  if (/vbaProject\.bin$/i.test(fileName)) {
    throw unreadable('The workbook holds macros. Save it as XLSX without macros.');
  }
  if (/(^|\/)externalLinks\//i.test(fileName)) {
    throw unreadable('The workbook links to other workbooks. Copy the prices as values into a new one.');
  }
}

interface EntryCount {
  readonly inflatedBytes: number;
  readonly holdsDocumentType: boolean;
  readonly holdsUnreadDateSystem: boolean;
}

const documentType = /<!(doctype|entity)/i;
/** A spelling of the 1904 date system that the workbook reader takes for the 1900 one: dates would be four years off. */
const unreadDateSystem = /date1904\s*=\s*["']true/i;
const longestMark = 24;

/** Inflates one entry and throws it away, counting; stops at the first byte beyond what is left. */
function countEntry(zip: ZipFile, entry: Entry, bytesLeft: number): Promise<EntryCount> {
  return new Promise((resolve, reject) => {
    zip.openReadStream(entry, (error, stream) => {
      if (error !== null) {
        reject(brokenWorkbook());
        return;
      }
      let inflatedBytes = 0;
      let holdsDocumentType = false;
      let holdsUnreadDateSystem = false;
      let tail = '';
      stream.on('data', (chunk: Buffer) => {
        inflatedBytes += chunk.length;
        const text = tail + chunk.toString('latin1');
        if (documentType.test(text)) holdsDocumentType = true;
        if (unreadDateSystem.test(text)) holdsUnreadDateSystem = true;
        tail = text.slice(-longestMark);
        if (inflatedBytes > bytesLeft) {
          stream.destroy();
          reject(
            new PriceFileError(
              'too-large',
              `The workbook unpacks to more than ${megabytes(readingLimits.workbookInflatedBytes)}. Save the sheet as CSV.`,
            ),
          );
        }
      });
      stream.on('error', () => reject(brokenWorkbook()));
      stream.on('end', () => resolve({ inflatedBytes, holdsDocumentType, holdsUnreadDateSystem }));
    });
  });
}

/**
 * Refuses a packed file that is no plain workbook or would unpack to too much, before anything parses it.
 * Declared sizes are not trusted: every entry is inflated and counted.
 */
export async function inspectWorkbook(bytes: Buffer): Promise<void> {
  const zip = await open(bytes);
  const names = new Set<string>();
  let inflated = 0;
  let packed = 0;
  if (zip.entryCount > readingLimits.workbookEntries) {
    throw new PriceFileError(
      'too-large',
      `The workbook has ${zip.entryCount} parts; at most ${readingLimits.workbookEntries} are read. Save the sheet as CSV.`,
    );
  }
  await new Promise<void>((resolve, reject) => {
    const inspect = async (entry: Entry) => {
      refuseByName(entry);
      if (entry.isEncrypted()) throw unreadable('The workbook is encrypted. Save it without a password.');
      names.add(entry.fileName);
      packed += entry.compressedSize;
      if (packed > bytes.length) throw brokenWorkbook(); // entries that overlap
      const counted = await countEntry(zip, entry, readingLimits.workbookInflatedBytes - inflated);
      inflated += counted.inflatedBytes;
      if (counted.holdsDocumentType && /\.(xml|rels)$/i.test(entry.fileName)) {
        throw unreadable('The workbook declares entities of its own. Save it again with a spreadsheet as XLSX.');
      }
      if (counted.holdsUnreadDateSystem && entry.fileName === 'xl/workbook.xml') {
        throw unreadable('The workbook counts its dates from 1904 in a form that is not read. Save the sheet as CSV.');
      }
      const ratio = counted.inflatedBytes / Math.max(1, entry.compressedSize);
      if (counted.inflatedBytes > readingLimits.workbookRatioFromBytes && ratio > readingLimits.workbookRatio) {
        throw new PriceFileError(
          'too-large',
          `A part of the workbook unpacks to more than ${readingLimits.workbookRatio} times its size. Save the sheet as CSV.`,
        );
      }
      zip.readEntry();
    };
    zip.on('entry', (entry: Entry) => {
      inspect(entry).catch(reject);
    });
    zip.on('error', () => reject(brokenWorkbook()));
    zip.on('end', () => resolve());
    zip.readEntry();
  });
  if (!names.has('[Content_Types].xml') || !names.has('xl/workbook.xml')) {
    throw unreadable('The file is a packed file but no workbook. Unpack it and choose the table inside.');
  }
}
