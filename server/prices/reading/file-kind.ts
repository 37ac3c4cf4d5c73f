import { unreadable } from '@/server/prices/reading/price-file-error';

export type FileKind = 'text' | 'workbook';

const startsWith = (bytes: Uint8Array, signature: readonly number[]): boolean =>
  signature.every((byte, index) => bytes[index] === byte);

const zipSignature = [0x50, 0x4b, 0x03, 0x04];
const emptyZipSignature = [0x50, 0x4b, 0x05, 0x06];
const compoundFileSignature = [0xd0, 0xcf, 0x11, 0xe0];
const utf16Signatures = [
  [0xff, 0xfe],
  [0xfe, 0xff],
];

const extensionOf = (fileName: string): string => /\.([^.]*)$/.exec(fileName)?.[1]?.toLowerCase() ?? '';
const textExtensions = ['csv', 'tsv', 'txt'];

/** Decides by content what the file is, and refuses a name that says otherwise. */
export function detectFileKind(bytes: Uint8Array, fileName: string): FileKind {
  if (bytes.length === 0) throw unreadable('The file is empty. Choose a file with a header and one row a session.');
  const extension = extensionOf(fileName);
  if (startsWith(bytes, compoundFileSignature)) {
    throw unreadable(
      'The workbook is protected by a password or in the old XLS format. Save it as XLSX without a password.',
    );
  }
  if (startsWith(bytes, zipSignature) || startsWith(bytes, emptyZipSignature)) {
    if (extension !== 'xlsx') {
      throw unreadable(
        `The file is named "${fileName}" but is a packed file. If it is a workbook, save it as XLSX; otherwise unpack it first.`,
      );
    }
    return 'workbook';
  }
  const isUtf16 = utf16Signatures.some((signature) => startsWith(bytes, signature));
  if (!isUtf16 && bytes.includes(0)) {
    throw unreadable('The file is binary: it is neither text nor an XLSX workbook. Save the prices as CSV or XLSX.');
  }
  if (extension === 'xlsx') {
    throw unreadable(
      'The file is named .xlsx but is no workbook. If it is text, name it .csv; otherwise save it again as XLSX.',
    );
  }
  if (!textExtensions.includes(extension)) {
    throw unreadable(`Files named ".${extension}" are not read. Save the prices as CSV, TSV, TXT or XLSX.`);
  }
  return 'text';
}
