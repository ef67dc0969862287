import { describe, expect, it } from 'vitest';
import { paths, safeNext } from './paths.ts';

describe('addresses', () => {
  it('escape what comes from data', () => {
    expect(paths.hull('a/b?c')).toBe('/hulls/a%2Fb%3Fc');
    expect(paths.fitForHull('hul_1&x=2')).toBe('/fit?hull=hul_1%26x%3D2');
  });

  it('after signing in lead only to this site', () => {
    expect(safeNext('/fit?hull=hul_1')).toBe('/fit?hull=hul_1');
    for (const elsewhere of [null, '', 'https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example', 'fit']) {
      expect(safeNext(elsewhere)).toBe('/');
    }
  });
});
