import type { ResultsPlan } from '@/lib/results-file';

export const TODAY = '2026-12-01';

/** Two items, two measurands, one of them in duplicate; invented. */
export const PLAN: ResultsPlan = {
  round: 'Maize 7',
  items: [
    { code: 'M1', name: 'Maize meal' },
    { code: 'M2', name: 'Maize germ' },
  ],
  measurands: [
    {
      roundMeasurandId: 11,
      item: 'M1',
      measurand: 'AFT',
      name: 'Total aflatoxins',
      unit: 'ug/kg',
      replicates: 2,
    },
    {
      roundMeasurandId: 12,
      item: 'M1',
      measurand: 'DON',
      name: 'Deoxynivalenol',
      unit: 'ug/kg',
      replicates: 1,
    },
    {
      roundMeasurandId: 13,
      item: 'M2',
      measurand: 'DON',
      name: 'Deoxynivalenol',
      unit: 'mg/kg',
      replicates: 1,
    },
  ],
  methods: ['IAC-1', 'LC-2'],
};

export const HEADER =
  'item,measurand,replicate,result,unit,expanded_uncertainty,coverage_factor,loq,method,analysed_on,comment';

export function utf8(text: string): Uint8Array {
  return new TextEncoder().encode(text);
}

export function utf16(text: string, order: 'LE' | 'BE', hasMark: boolean): Uint8Array {
  const marked = hasMark ? `\ufeff${text}` : text;
  const bytes = new Uint8Array(marked.length * 2);
  const view = new DataView(bytes.buffer);
  for (let i = 0; i < marked.length; i += 1) view.setUint16(i * 2, marked.charCodeAt(i), order === 'LE');
  return bytes;
}

/** Only for characters below U+0100 and the euro sign. */
export function windows1252(text: string): Uint8Array {
  return Uint8Array.from(text, (character) => (character === '\u20ac' ? 0x80 : character.charCodeAt(0)));
}

/** A file with the full header and the rows as they are. */
export function file(...rows: string[]): string {
  return `${[HEADER, ...rows].join('\n')}\n`;
}

/** A file whose only row has this result for M1, AFT. */
export function resultFile(result: string, rest = ',,,,,,,'): string {
  return file(`M1,AFT,1,${result}${rest}`);
}

export function join(...parts: (string | number[])[]): Uint8Array {
  return Uint8Array.from(parts.flatMap((part) => (typeof part === 'string' ? [...utf8(part)] : part)));
}
