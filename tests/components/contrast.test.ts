import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';

// Formula: WCAG 2.2, "relative luminance" and "contrast ratio" (published definitions).
const css = readFileSync(path.join(import.meta.dirname, '../../app/globals.css'), 'utf8');

type Tokens = Record<string, string>;

function tokensOf(block: string): Tokens {
  return Object.fromEntries(
    [...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/g)].map(([, name, hex]) => [name, hex]),
  );
}

function blockAfter(selector: string): string {
  const start = css.indexOf(selector);
  expect(start, `${selector} in globals.css`).toBeGreaterThanOrEqual(0);
  return css.slice(start, css.indexOf('}', start));
}

const light = tokensOf(blockAfter(':root {'));
const darkChosen = tokensOf(blockAfter(":root[data-theme='dark']"));
const darkBySystem = tokensOf(blockAfter(":root:not([data-theme='light'], [data-theme='dark'])"));

function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [bright = 0, dim = 0] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (bright + 0.05) / (dim + 0.05);
}

const GROUNDS = ['paper', 'paper-raised', 'paper-wash'];
const TEXTS = ['ink', 'ink-soft', 'ink-faint', 'press', 'press-strong', 'warning', 'action', 'grey'];
const TEXT_PAIRS = [
  ...GROUNDS.flatMap((ground) => TEXTS.map((text) => [text, ground])),
  ...['ink', 'ink-soft', 'press', 'warning', 'action', 'grey'].map((text) => [text, 'maize-wash']),
  ['press-ink', 'press'],
  ['press-ink', 'press-strong'],
  ['maize-ink', 'maize'],
  ['action-ink', 'action'],
] as [string, string][];
// Shapes and borders that carry meaning; maize always comes with an ink outline or a bold word.
const SHAPE_PAIRS = [
  ['rule-strong', 'paper'],
  ['rule-strong', 'paper-raised'],
  ['warning', 'paper'],
  ['action', 'paper'],
  ['action', 'paper-raised'],
  ['press', 'paper'],
  ['ink', 'maize'],
] as [string, string][];

describe('theme colours', () => {
  it('finds every token in each theme', () => {
    expect(Object.keys(light)).toHaveLength(18);
    expect(Object.keys(darkChosen).sort()).toEqual(Object.keys(light).sort());
  });

  it('has one dark theme, whether chosen or taken from the system', () => {
    expect(darkBySystem).toEqual(darkChosen);
  });

  describe.each([
    ['light', light],
    ['dark', darkChosen],
  ])('%s', (_, tokens) => {
    it.each(TEXT_PAIRS)('text %s on %s reaches 4.5 to 1', (text, ground) => {
      expect(contrast(tokens[text] ?? '', tokens[ground] ?? '')).toBeGreaterThanOrEqual(4.5);
    });

    it.each(SHAPE_PAIRS.filter(([shape]) => !(tokens === darkChosen && shape === 'ink')))(
      'shape %s on %s reaches 3 to 1',
      (shape, ground) => {
        expect(contrast(tokens[shape] ?? '', tokens[ground] ?? '')).toBeGreaterThanOrEqual(3);
      },
    );
  });

  it('keeps the maize mark visible on dark paper, where its ink outline is light too', () => {
    expect(contrast(darkChosen.maize ?? '', darkChosen.paper ?? '')).toBeGreaterThanOrEqual(3);
  });

  it('computes the ratio of black on white as 21', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  });
});
