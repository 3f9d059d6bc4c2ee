// Every pair of colours that carries words or a control's edge is measured again from the token table.
// Formula: WCAG 2.2, "relative luminance" and "contrast ratio" (https://www.w3.org/TR/WCAG22/#dfn-contrast-ratio).
import { describe, expect, it } from 'vitest';
import { TOKENS, type Theme, type TokenName } from '../../src/styles/tokens';

function luminance(hex: string): number {
  const channel = (from: number) => {
    const value = Number.parseInt(hex.slice(from, from + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  };
  return 0.2126 * channel(1) + 0.7152 * channel(3) + 0.0722 * channel(5);
}

function contrast(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light + 0.05) / (dark + 0.05);
}

const AAA = 7;
const AA = 4.5;
/** WCAG 2.2 success criterion 1.4.11, for edges of controls and graphics that carry meaning. */
const GRAPHIC = 3;

type Pair = readonly [front: TokenName, back: TokenName, least: number];

const on = (front: TokenName, least: number, ...backs: TokenName[]): Pair[] =>
  backs.map((back) => [front, back, least]);

const PAIRS: readonly Pair[] = [
  ...on(
    'ink',
    AAA,
    'ground',
    'sheet',
    'well',
    'plate',
    'tag',
    'red-soft',
    'green-soft',
    'amber-soft',
    'blue-soft',
  ),
  ...on('ink-2', AAA, 'ground', 'sheet', 'well', 'red-soft', 'green-soft', 'amber-soft'),
  ...on('ink-2', AA, 'plate'),
  ...on('tag-ink-2', AAA, 'tag'),
  ...on('red-ink', AAA, 'sheet', 'red-soft'),
  ...on('red-ink', AA, 'ground', 'tag'),
  ...on('on-red', AA, 'red', 'red-press'),
  ...on('green-ink', AAA, 'sheet', 'ground', 'tag', 'green-soft'),
  ...on('on-green', AA, 'green'),
  ...on('amber-ink', AAA, 'sheet', 'ground', 'amber-soft'),
  ...on('amber-ink', AA, 'tag'),
  ...on('on-amber', AAA, 'amber'),
  ...on('blue-ink', AAA, 'sheet', 'ground', 'tag', 'blue-soft'),
  ...on('on-stop', AAA, 'stop'),
  ...on('line-2', GRAPHIC, 'sheet', 'ground', 'well'),
  ...on('tag-edge', GRAPHIC, 'ground', 'tag'),
  ...on('red', GRAPHIC, 'sheet', 'ground', 'tag'),
  ...on('green', GRAPHIC, 'sheet', 'ground', 'tag'),
  ...on('blue', GRAPHIC, 'sheet', 'ground'),
  ...on('focus', GRAPHIC, 'ground', 'sheet', 'tag', 'well', 'plate'),
];

const THEMES: readonly Theme[] = ['light', 'dark'];

describe('contrast of the colour tokens', () => {
  it('when the formula meets known pairs, then it gives the published ratios', () => {
    // Black on white is 21:1 by definition; #767676 is the lightest grey with 4.5:1 on white (WebAIM, "Contrast and
    // Color Accessibility"), and #777777 just misses it at 4.48:1.
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 10);
    expect(contrast('#767676', '#FFFFFF')).toBeGreaterThanOrEqual(4.5);
    expect(contrast('#777777', '#FFFFFF')).toBeCloseTo(4.48, 2);
  });

  for (const theme of THEMES) {
    it.each(PAIRS)(`when %s stands on %s in ${theme}, then it reaches %s:1`, (front, back, least) => {
      expect(contrast(TOKENS[front][theme], TOKENS[back][theme])).toBeGreaterThanOrEqual(least);
    });
  }

  it('when a token has a theme, then both themes are six-digit hex', () => {
    for (const token of Object.values(TOKENS)) {
      expect(token.light).toMatch(/^#[0-9A-F]{6}$/);
      expect(token.dark).toMatch(/^#[0-9A-F]{6}$/);
    }
  });
});
