import { nameBinaryFile, nameOtherText, startsWith } from './file-kind';
import { MAX_BYTES } from './limits';
import { makeProblem, type Problem } from './problem';
import type { TextEncodingName } from './result-types';
import { countLineFeeds } from './scan-lines';

export type DecodedFile =
  { ok: true; text: string; encoding: TextEncodingName } | { ok: false; problem: Problem };

const SAVE_AS = 'Save the sheet as "CSV UTF-8" and upload that file.';
const BYTES_PER_MEGABYTE = 1024 * 1024;

/** Turns the bytes of an upload into text without a byte-order mark, or says why they are not a text of results. */
export function decodeFile(bytes: Uint8Array): DecodedFile {
  const refusal = refuseBytes(bytes);
  if (refusal !== null) return { ok: false, problem: refusal };
  const decoded = decodeText(bytes);
  if (!decoded.ok) return decoded;
  const complaint = refuseText(decoded.text);
  return complaint === null ? decoded : { ok: false, problem: complaint };
}

function refuseBytes(bytes: Uint8Array): Problem | null {
  if (bytes.length > MAX_BYTES) {
    const size = `${(bytes.length / BYTES_PER_MEGABYTE).toFixed(1)} MB`;
    return makeProblem({
      code: 'too-large',
      found: size,
      foundWords: `the file has ${size}`,
      expected: `At most ${MAX_BYTES / BYTES_PER_MEGABYTE} MB are taken.`,
    });
  }
  if (bytes.length === 0) {
    return makeProblem({
      code: 'empty-file',
      found: '',
      foundWords: 'the file is empty',
      expected: 'Write a header line and one row for each result.',
    });
  }
  const kind = nameBinaryFile(bytes);
  return kind === null ? null : notCsv(kind);
}

function notCsv(kind: string): Problem {
  return makeProblem({
    code: 'not-text',
    found: kind,
    foundWords: `the file is ${kind}, not a CSV text file`,
    expected: SAVE_AS,
  });
}

function refuseText(text: string): Problem | null {
  if (text.trim() === '') {
    return makeProblem({
      code: 'empty-file',
      found: '',
      foundWords: 'the file holds nothing but white space',
      expected: 'Write a header line and one row for each result.',
    });
  }
  const nul = text.indexOf('\0');
  if (nul >= 0) return nulProblem(text, nul);
  const kind = nameOtherText(text);
  return kind === null ? null : notCsv(kind);
}

function nulProblem(text: string, at: number): Problem {
  const before = text.slice(0, at).replace(/\r\n?/g, '\n');
  const position = before.length - before.lastIndexOf('\n');
  return makeProblem({
    code: 'nul-byte',
    line: 1 + countLineFeeds(before, 0, before.length),
    found: '\0',
    foundWords: `character ${position} is a NUL byte, which no text holds`,
    expected: `The file is damaged or not a text file. ${SAVE_AS}`,
  });
}

function decodeText(bytes: Uint8Array): DecodedFile {
  const marked = encodingByMark(bytes);
  if (marked !== null) return decodeFatal(bytes, marked);
  const wide = encodingByNulPattern(bytes);
  if (wide !== null) return decodeFatal(bytes, wide);
  const utf8 = decodeFatal(bytes, 'UTF-8');
  return utf8.ok ? utf8 : { ok: true, encoding: 'Windows-1252', text: decodeWindows1252(bytes) };
}

function encodingByMark(bytes: Uint8Array): TextEncodingName | null {
  if (startsWith(bytes, [0xef, 0xbb, 0xbf])) return 'UTF-8';
  if (startsWith(bytes, [0xff, 0xfe])) return 'UTF-16LE';
  if (startsWith(bytes, [0xfe, 0xff])) return 'UTF-16BE';
  return null;
}

/** Header names are ASCII, so in UTF-16 every other byte of the beginning is NUL, and only those. */
function encodingByNulPattern(bytes: Uint8Array): TextEncodingName | null {
  const length = Math.min(bytes.length, 64) & ~1;
  if (length < 4) return null;
  let even = 0;
  let odd = 0;
  for (let i = 0; i < length; i += 2) {
    if (bytes[i] === 0) even += 1;
    if (bytes[i + 1] === 0) odd += 1;
  }
  const most = 0.8 * (length / 2);
  if (odd >= most && even === 0) return 'UTF-16LE';
  if (even >= most && odd === 0) return 'UTF-16BE';
  return null;
}

/** TextDecoder takes off a byte-order mark by itself. */
function decodeFatal(bytes: Uint8Array, encoding: TextEncodingName): DecodedFile {
  try {
    return { ok: true, encoding, text: new TextDecoder(encoding, { fatal: true }).decode(bytes) };
  } catch (cause) {
    if (!(cause instanceof TypeError)) throw cause;
    const problem = makeProblem({
      code: 'bad-encoding',
      found: encoding,
      foundWords: `the file begins as ${encoding} text and then has bytes that are not ${encoding}`,
      expected: `It may be cut short or joined from two files. ${SAVE_AS}`,
    });
    return { ok: false, problem };
  }
}

// The characters of Windows-1252 at 0x80 to 0x9f; the five gaps keep their control codes, as the WHATWG
// Encoding Standard, index windows-1252, has it. Some versions of Node decode these bytes as Latin-1.
const FROM_0X80 =
  '\u20ac\u0081\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\u008d\u017d\u008f' +
  '\u0090\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\u009d\u017e\u0178';

function decodeWindows1252(bytes: Uint8Array): string {
  const text = new TextDecoder('windows-1252').decode(bytes);
  return text.replace(/[\u0080-\u009f]/g, (code) => FROM_0X80.charAt(code.charCodeAt(0) - 0x80));
}
