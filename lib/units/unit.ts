/** The two kinds of quantity that results are reported in. They do not convert into each other without a density. */
export type Dimension = 'mass-fraction' | 'mass-concentration';

export type Unit = {
  /** UCUM code, the micro prefix written u. */
  code: string;
  /** The text as it was written. */
  text: string;
  dimension: Dimension;
  /** The unit is 10 to this power of g/g (mass fraction) or of g/L (mass concentration). */
  exponent: number;
};

export type ParsedUnit =
  | { ok: true; unit: Unit }
  /** suggestion: the UCUM code that was probably meant, or null. */
  | { ok: false; text: string; suggestion: string | null };

// SI prefixes and special units by their UCUM codes. Source: The Unified Code for Units of Measure, tables 1 and
// 3 (regenstrief.org), from memory.
const PREFIX: Record<string, number> = { k: 3, '': 0, d: -1, c: -2, m: -3, u: -6, n: -9, p: -12, f: -15 };
const CUBIC_METRE: Record<string, number> = { m3: 3, dm3: 0, cm3: -3 };
const PURE_NUMBER: Record<string, number> = {
  '1': 0,
  '%': -2,
  '[ppth]': -3,
  '[ppm]': -6,
  '[ppb]': -9,
  '[pptr]': -12,
};

const MASS = /^([kdcmunpf]?)g$/;
const VOLUME = /^([kdcmunpf]?)[lL]$/;
const POWER_OF_TEN = /^10[*^]-(\d|1[0-5])$/;
const QUOTIENT = /^([a-z]+)\/(.+)$/;
const PRODUCT = /^([a-z]+)\.([a-zA-Z]+)-1$/;
/** U+00B5 and U+03BC look alike and both stand for micro in what keyboards and spreadsheets write. */
const MICRO = /[\u00b5\u03bc]/g;

function massExponent(text: string): number | null {
  if (text === 't') return 6;
  if (text === '(100.g)') return 2;
  const prefix = MASS.exec(text)?.[1];
  return prefix === undefined ? null : (PREFIX[prefix] ?? null);
}

function volumeExponent(text: string): number | null {
  const cubic = CUBIC_METRE[text];
  if (cubic !== undefined) return cubic;
  const prefix = VOLUME.exec(text)?.[1];
  return prefix === undefined ? null : (PREFIX[prefix] ?? null);
}

function readCode(code: string): Pick<Unit, 'dimension' | 'exponent'> | null {
  const pure = Object.hasOwn(PURE_NUMBER, code) ? PURE_NUMBER[code] : undefined;
  if (pure !== undefined) return { dimension: 'mass-fraction', exponent: pure };
  const power = POWER_OF_TEN.exec(code)?.[1];
  if (power !== undefined) return { dimension: 'mass-fraction', exponent: 0 - Number(power) };

  const parts = QUOTIENT.exec(code) ?? PRODUCT.exec(code);
  if (parts === null) return null;
  const above = massExponent(parts[1] ?? '');
  if (above === null) return null;
  const mass = massExponent(parts[2] ?? '');
  if (mass !== null) return { dimension: 'mass-fraction', exponent: above - mass };
  const volume = volumeExponent(parts[2] ?? '');
  return volume === null ? null : { dimension: 'mass-concentration', exponent: above - volume };
}

/**
 * Reads a UCUM code of a mass fraction or a mass concentration: ug/kg, ng/g, %, [ppb], 10*-9, ug.kg-1, ng/mL.
 *
 * The micro sign is taken for u, since nothing else can be meant. Other slips (capitals, ppb without brackets,
 * spaces) are not taken but answered with the code that was probably meant: Mg is not mg in UCUM.
 */
export function parseUnit(text: string): ParsedUnit {
  const trimmed = text.trim();
  const code = trimmed.replace(MICRO, 'u');
  const read = readCode(code);
  if (read !== null) return { ok: true, unit: { code, text: trimmed, ...read } };
  return { ok: false, text: trimmed, suggestion: suggestCode(code) };
}

/** ppt is left out on purpose: it is read as parts per thousand and as parts per trillion. */
const COMMON_NAMES: Record<string, string> = {
  ppb: '[ppb]',
  ppm: '[ppm]',
  percent: '%',
  '%w/w': '%',
  '%(w/w)': '%',
  'w/w%': '%',
};

/** No code is longer; the searches below are quadratic in the length. */
const LONGEST_CODE = 40;

function suggestCode(code: string): string | null {
  if (code.length > LONGEST_CODE) return null;
  const plain = code
    .toLowerCase()
    .replace(MICRO, 'u')
    .replace(/\u207b\u00b9|\^-1|\*\*-1/g, '-1')
    .replace(/[\u00b7\u22c5]/g, '.')
    .replace(/\bper\s+(?!cent)/g, '/')
    .replace(/[a-z]+(?=\s+[a-z]+-1$)/, '$&.')
    .replace(/\s+/g, '')
    .replace(/^(mcg|microg)(?=[/.])/, 'ug');
  const named = Object.hasOwn(COMMON_NAMES, plain) ? COMMON_NAMES[plain] : undefined;
  if (named !== undefined) return named;
  const quotient = plain.replace(/^([a-z]+)\.([a-z]+)-1$/, '$1/$2');
  return readCode(quotient) === null ? null : quotient.replace(/l$/, 'L');
}
