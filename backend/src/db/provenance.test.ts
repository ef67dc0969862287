import { expect, test } from 'vitest';
import { type Origin, packProvenance, unpackProvenance } from './schema/provenance.ts';

const list: Origin = { basis: 'published', sigma: null, source: 'spring list', sourceDate: '2024-05' };
const tape: Origin = { basis: 'measured', sigma: 4, source: 'own tape', sourceDate: null };

test('what is packed reads back, each origin written once', () => {
  const provenance = { maker: list, model: list, beamM: tape, lengthM: { ...list }, deadriseDeg: { ...tape } };
  const text = packProvenance(provenance);
  expect(unpackProvenance(text)).toEqual(provenance);
  expect(text.split('spring list')).toHaveLength(2);
  expect(text.split('own tape')).toHaveLength(2);
  expect(unpackProvenance(packProvenance({}))).toEqual({});
});

test('what was written out in full is still read', () => {
  expect(unpackProvenance(JSON.stringify({ maker: list, beamM: tape }))).toEqual({ maker: list, beamM: tape });
});
