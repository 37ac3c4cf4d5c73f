import { unreadable } from '@/server/prices/reading/price-file-error';

const decodeStrictly = (encoding: string, bytes: Uint8Array): string | null => {
  try {
    return new TextDecoder(encoding, { fatal: true }).decode(bytes); // leaves a byte order mark out
  } catch (error) {
    const isNoText = Object(error).code === 'ERR_ENCODING_INVALID_ENCODED_DATA'; // the code says more than the class
    if (isNoText) return null;
    throw error;
  }
};

/** Bytes that Windows-1252 leaves without a character. */
const undefinedInWindows1252 = [0x81, 0x8d, 0x8f, 0x90, 0x9d];

/**
 * The text of a file: UTF-16 by its byte order mark, else UTF-8, else Windows-1252.
 * The last is safe here because dates and prices are plain ASCII and nothing else of the file is stored; header words
 * are shown in the preview as they were read.
 */
export function decodeText(bytes: Uint8Array): string {
  const isUtf16 = (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
  const text = isUtf16
    ? decodeStrictly(bytes[0] === 0xff ? 'utf-16le' : 'utf-16be', bytes)
    : (decodeStrictly('utf-8', bytes) ??
      (undefinedInWindows1252.some((byte) => bytes.includes(byte)) ? null : decodeStrictly('windows-1252', bytes)));
  if (text === null) {
    throw unreadable('The characters of the file cannot be read. Save it again as CSV with the encoding UTF-8.');
  }
  if (text.trim() === '') throw unreadable('The file is empty. Choose a file with a header and one row a session.');
  // Control characters other than tab and line ends are no text; NUL hides in UTF-16 files.
  if (/[\u0000-\u0008\u000b\u000c\u000e-\u001f]/.test(text)) {
    throw unreadable('The file is binary: it is neither text nor an XLSX workbook. Save the prices as CSV or XLSX.');
  }
  if (/^\s*<(!doctype|html|\?xml|table|svg)/i.test(text)) {
    throw unreadable(
      'The file is a web page, not a table of prices. Open it in a spreadsheet and save it as CSV or XLSX.',
    );
  }
  return text;
}
