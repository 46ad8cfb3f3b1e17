type Signature = { bytes: readonly number[]; name: string };

const ascii = (text: string): number[] => [...text].map((character) => character.charCodeAt(0));

// First bytes of files that get renamed to .csv by mistake. Source: the formats' own specifications, from memory.
const SIGNATURES: readonly Signature[] = [
  { bytes: [0x89, ...ascii('PNG')], name: 'a PNG picture' },
  { bytes: [0xff, 0xd8, 0xff], name: 'a JPEG picture' },
  { bytes: ascii('GIF8'), name: 'a GIF picture' },
  { bytes: ascii('%PDF-'), name: 'a PDF document' },
  { bytes: [0x1f, 0x8b], name: 'a GZIP archive' },
  { bytes: [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1], name: 'an old Excel workbook (XLS)' },
  { bytes: ascii('{\\rtf'), name: 'an RTF document' },
  { bytes: ascii('7z\u00bc\u00af'), name: 'a 7-Zip archive' },
  { bytes: ascii('Rar!'), name: 'a RAR archive' },
  { bytes: ascii('SQLite format 3'), name: 'an SQLite database' },
  { bytes: [0xff, 0xfe, 0, 0], name: 'UTF-32 text' },
  { bytes: [0, 0, 0xfe, 0xff], name: 'UTF-32 text' },
];

const ZIP_STARTS: readonly (readonly number[])[] = [
  [...ascii('PK'), 3, 4],
  [...ascii('PK'), 5, 6],
];

export function startsWith(bytes: Uint8Array, start: readonly number[]): boolean {
  return bytes.length >= start.length && start.every((byte, index) => bytes[index] === byte);
}

/** The name of a kind of file that is not text, told by its first bytes; null when none is recognised. */
export function nameBinaryFile(bytes: Uint8Array): string | null {
  if (ZIP_STARTS.some((start) => startsWith(bytes, start))) return nameZip(bytes);
  return SIGNATURES.find((signature) => startsWith(bytes, signature.bytes))?.name ?? null;
}

/** What a ZIP holds stands in the names of its first entries. */
function nameZip(bytes: Uint8Array): string {
  const start = String.fromCharCode(...bytes.subarray(0, 4096));
  if (start.includes('opendocument.spreadsheet')) return 'an OpenDocument spreadsheet';
  if (start.includes('word/')) return 'a Word document';
  if (start.includes('xl/') || start.includes('[Content_Types].xml')) return 'an Excel workbook (XLSX)';
  return 'a ZIP archive';
}

/** The name of a kind of text that is no CSV, told by its first characters. */
export function nameOtherText(text: string): string | null {
  const start = text.slice(0, 200).trimStart().toLowerCase();
  if (start.startsWith('<!doctype html') || start.startsWith('<html')) return 'a web page (HTML)';
  if (start.startsWith('<?xml')) return 'an XML document';
  if (/^(\{\s*["}]|\[\s*[{"[\]])/.test(start)) return 'JSON';
  return null;
}
