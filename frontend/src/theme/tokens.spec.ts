import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { describe, expect, it } from 'vitest';
import { themes, type ThemeName, type TokenName } from './tokens';

const css = readFileSync(resolve(import.meta.dirname, 'tokens.css'), 'utf8');

/** Relative luminance and contrast ratio: WCAG 2.2, definitions of these terms. */
function luminance(hex: string): number {
  const [r = 0, g = 0, b = 0] = [1, 3, 5]
    .map((at) => parseInt(hex.slice(at, at + 2), 16) / 255)
    .map((v) => (v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4));
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [low = 0, high = 1] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
}

function declared(selector: string): Record<string, string> {
  const from = css.indexOf(selector);
  const block = css.slice(css.indexOf('{', from) + 1, css.indexOf('}', from));
  return Object.fromEntries(
    [...block.matchAll(/--(\w+): ([^;]+);/g)].map(([, name = '', value = '']) => [name, value]),
  );
}

const names = Object.keys(themes) as ThemeName[];
const words: TokenName[] = ['ink', 'ink2', 'ink3', 'primer', 'primerStrong', 'water', 'brass', 'green', 'red'];
const washes: TokenName[] = ['primerWash', 'waterWash', 'brassWash', 'greenWash', 'redWash', 'paper2'];

describe('tokens', () => {
  it('measures contrast as WCAG does: black on white is 21 to 1, a color on itself 1', () => {
    expect(contrast('#000000', '#FFFFFF')).toBeCloseTo(21, 5);
    expect(contrast('#5B2C90', '#5B2C90')).toBe(1);
  });

  it.each(names)('the custom properties of %s are its tokens', (name) => {
    const found = declared(`[data-theme='${name}']`);
    const wanted = Object.entries(themes[name]).map(([key, value]) => [
      key,
      value.startsWith('#') ? value.toLowerCase() : value,
    ]);
    expect(found).toEqual(Object.fromEntries(wanted));
  });

  // WCAG 2.2, 1.4.3: 4.5 to 1 for words, on paper and on every ground they stand on.
  it.each(names)('words of %s are read on paper and on each ground', (name) => {
    const t = themes[name];
    const pairs = words.flatMap((word) => (['paper', ...washes] as const).map((ground) => [word, ground] as const));
    const faint = pairs
      .map(([word, ground]) => ({ word, ground, ratio: contrast(t[word], t[ground]) }))
      .filter(({ ratio }) => ratio < 4.5);
    expect(faint).toEqual([]);
  });

  it.each(names)('words on filled acts of %s are read', (name) => {
    const t = themes[name];
    expect(contrast(t.onPrimer, t.primer)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(t.onRed, t.red)).toBeGreaterThanOrEqual(4.5);
    expect(contrast(t.onBrass, t.brassFill)).toBeGreaterThanOrEqual(4.5);
  });

  // WCAG 2.2, 1.4.11: 3 to 1 for the edges of controls.
  it.each(names)('edges of controls of %s are seen', (name) => {
    expect(contrast(themes[name].rule2, themes[name].paper)).toBeGreaterThanOrEqual(3);
  });
});
