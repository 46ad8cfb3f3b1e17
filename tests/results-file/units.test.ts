import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  convert,
  isDecimalText,
  massFractionPerUnit,
  numberFromDecimal,
  parseUnit,
  shiftDecimal,
  unitFactorExponent,
} from '@/lib/units';

describe('parseUnit', () => {
  // Exponents follow from the SI prefixes: common practice, no source.
  it.each([
    ['ug/kg', 'mass-fraction', -9],
    ['\u00b5g/kg', 'mass-fraction', -9],
    ['\u03bcg/kg', 'mass-fraction', -9],
    ['ug.kg-1', 'mass-fraction', -9],
    ['ng/g', 'mass-fraction', -9],
    ['ng/kg', 'mass-fraction', -12],
    ['mg/kg', 'mass-fraction', -6],
    ['mg/t', 'mass-fraction', -9],
    ['ug/g', 'mass-fraction', -6],
    ['mg/g', 'mass-fraction', -3],
    ['g/kg', 'mass-fraction', -3],
    ['g/g', 'mass-fraction', 0],
    ['g/(100.g)', 'mass-fraction', -2],
    ['%', 'mass-fraction', -2],
    ['[ppth]', 'mass-fraction', -3],
    ['[ppm]', 'mass-fraction', -6],
    ['[ppb]', 'mass-fraction', -9],
    ['[pptr]', 'mass-fraction', -12],
    ['10*-9', 'mass-fraction', -9],
    ['10^-6', 'mass-fraction', -6],
    ['1', 'mass-fraction', 0],
    ['g/L', 'mass-concentration', 0],
    ['mg/mL', 'mass-concentration', 0],
    ['mg/L', 'mass-concentration', -3],
    ['mg/dL', 'mass-concentration', -2],
    ['ug/L', 'mass-concentration', -6],
    ['ng/mL', 'mass-concentration', -6],
    ['ng/ml', 'mass-concentration', -6],
    ['ug/m3', 'mass-concentration', -9],
  ])('%s', (text, dimension, exponent) => {
    const parsed = parseUnit(` ${text} `);
    expect(parsed).toMatchObject({ ok: true, unit: { text, dimension, exponent } });
  });

  it.each([
    ['UG/KG', 'ug/kg'],
    ['ug/Kg', 'ug/kg'],
    ['Mg/kg', 'mg/kg'],
    ['NG/ML', 'ng/mL'],
    ['ug / kg', 'ug/kg'],
    ['ug per kg', 'ug/kg'],
    ['ug kg-1', 'ug/kg'],
    ['\u00b5g\u00b7kg\u207b\u00b9', 'ug/kg'],
    ['mcg/kg', 'ug/kg'],
    ['ppb', '[ppb]'],
    ['PPM', '[ppm]'],
    ['[PPB]', '[ppb]'],
    ['per cent', '%'],
    ['ppt', null],
    ['kg', null],
    ['constructor', null],
    ['', null],
    ['a'.repeat(2000), null],
  ])('%j is not taken; %j was probably meant', (text, suggestion) => {
    expect(parseUnit(text)).toEqual({ ok: false, text, suggestion });
  });
});

describe('convert', () => {
  it.each([
    ['0.1', 'mg/kg', 'ug/kg', 100, '100'],
    ['0.3', 'mg/kg', 'ug/kg', 300, '300'],
    ['1.20', 'ug/kg', 'mg/kg', 0.0012, '0.00120'],
    ['4.35', '%', 'g/kg', 43.5, '43.5'],
    ['-0.007', 'g/kg', '[ppb]', -7000, '-7000'],
    ['1.2e-3', 'mg/L', 'ng/mL', 1.2, '1.2'],
    ['12.5', 'ng/g', 'ug/kg', 12.5, '12.5'],
  ])('%s %s in %s', (text, from, to, value, exact) => {
    expect(convert(text, from, to)).toEqual({ value, text: exact });
  });

  it('does not convert between dimensions, unknown units or what is no number', () => {
    expect(convert('1', 'ug/L', 'ug/kg')).toBe(null);
    expect(convert('1', 'ppb', 'ug/kg')).toBe(null);
    expect(convert('1,5', 'mg/kg', 'ug/kg')).toBe(null);
    expect(unitFactorExponent('mg/kg', 'ug/kg')).toBe(3);
  });

  it('agrees with whole-number arithmetic on every digit', () => {
    const digits = fc.bigInt({ min: 0n, max: 10n ** 25n });
    fc.assert(
      fc.property(
        digits,
        fc.integer({ min: 0, max: 12 }),
        fc.integer({ min: -12, max: 12 }),
        (whole, places, shift) => {
          const padded = whole.toString().padStart(places + 1, '0');
          const text = places === 0 ? padded : `${padded.slice(0, -places)}.${padded.slice(-places)}`;
          const shifted = shiftDecimal(text, shift);
          const [before = '', after = ''] = shifted.split('.');
          // shifted = whole x 10^(shift - places), compared as integers over 10^24.
          expect(BigInt(before + after.padEnd(24, '0'))).toBe(
            (whole * 10n ** BigInt(24 + shift)) / 10n ** BigInt(places),
          );
          expect(numberFromDecimal(text, shift)).toBe(Number(shifted));
        },
      ),
      { seed: 20261201 },
    );
  });

  it('keeps far shifts short and reads them back', () => {
    expect(shiftDecimal('1e300', 3)).toBe('1e303');
    expect(Number(shiftDecimal('12.5e-200', -9))).toBe(12.5e-209);
    expect(() => shiftDecimal('x', 1)).toThrow('shiftDecimal requires a decimal number');
  });

  it('knows decimal text', () => {
    for (const text of ['0', '.5', '5.', '+1', '-1.5E+3']) expect(isDecimalText(text)).toBe(true);
    for (const text of ['', '.', '1e', '1 ', '0x1', 'NaN', '1,5', '--1'])
      expect(isDecimalText(text)).toBe(false);
  });
});

describe('massFractionPerUnit', () => {
  it('is the mass fraction of one unit, exactly the number one writes', () => {
    expect(massFractionPerUnit('ug/kg')).toBe(1e-9);
    expect(massFractionPerUnit('[ppm]')).toBe(1e-6);
    expect(massFractionPerUnit('%')).toBe(0.01);
    expect(massFractionPerUnit('g/g')).toBe(1);
  });

  it('is null for a concentration, which needs a density, and for what is not known', () => {
    expect(massFractionPerUnit('mg/L')).toBe(null);
    expect(massFractionPerUnit('ppb')).toBe(null);
  });
});
