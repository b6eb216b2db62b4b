import { describe, expect, it } from 'vitest';
import { qrPath } from './qr-path';

/** ISO/IEC 18004: a quiet zone of four modules, and finder patterns 1:1:3:1:1 in three corners. */
describe('the code on the tag', () => {
  const text = 'https://holdwater.example.test/lots/7c1f0a52-6c1e-4f6e-9a86-000000000017';
  const { size, path } = qrPath(text);
  const isDark = (column: number, row: number): boolean => path.includes(`M${column} ${row}h1`);

  it('has its quiet zone and a size the standard knows', () => {
    expect((size - 8 - 17) % 4).toBe(0);
    for (let at = 0; at < size; at += 1)
      expect([isDark(at, 3), isDark(3, at), isDark(size - 4, at)]).not.toContain(true);
  });

  it('has the three finder patterns', () => {
    const across = (column: number, row: number): string =>
      Array.from({ length: 7 }, (_, step) => (isDark(column + step, row + 3) ? '1' : '0')).join('');
    const far = size - 4 - 7;
    expect([across(4, 4), across(far, 4), across(4, far)]).toEqual(['1011101', '1011101', '1011101']);
    expect(across(far, far)).not.toBe('1011101');
  });

  it('is another code for another lot', () => {
    expect(qrPath(text.replace('17', '18')).path).not.toBe(path);
  });
});
