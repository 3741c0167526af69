import { expect, test } from 'vitest';
import { combine, leftOut } from '@/lib/engine/combinations/combine';
import { findSet, publishedSets } from '@/lib/engine/combinations/published-sets';
import type { LoadCase } from '@/lib/model/load';

const nothing = (id: string, nature: LoadCase['nature'], more: Partial<LoadCase> = {}): LoadCase => ({
  id,
  title: id,
  nature,
  reversible: false,
  loads: [],
  ...more,
});

function sums(key: string, cases: LoadCase[], purpose = 'strength', arrangements: string[][] = []): string[] {
  const set = findSet(key);
  if (!set) throw new Error(`no set ${key}`);
  return combine(cases, set, arrangements)
    .filter((c) => c.purpose === purpose)
    .map((c) => c.id);
}

/** ASCE/SEI 7-16, 2.3.1: numbers seen at second hand. */
test('writes the strength combinations of ASCE 7-16, companions acting or not', () => {
  const cases = [nothing('D', 'dead'), nothing('L', 'live'), nothing('S', 'snow'), nothing('W', 'wind')];
  expect(sums('asce-7-16-lrfd', cases)).toEqual([
    '1.4D',
    '1.2D+1.6L+0.5S',
    '1.2D+1.6L',
    '1.2D+L+1.6S',
    '1.2D+1.6S+0.5W',
    '1.2D+1.6S',
    '1.2D+L+0.5S+W',
    '1.2D+L+W',
    '1.2D+0.5S+W',
    '1.2D+W',
    '0.9D+W',
  ]);
});

test('roof live load, snow and rain stand in for each other and never act together', () => {
  const cases = [
    nothing('D', 'dead'),
    nothing('Lr', 'roof-live'),
    nothing('S', 'snow'),
    nothing('R', 'rain'),
  ];
  const found = sums('asce-7-16-lrfd', cases);
  expect(found).toEqual(['1.4D', '1.2D+1.6Lr', '1.2D+1.6S', '1.2D+1.6R']);
});

test('a reversible case acts with both signs', () => {
  const cases = [nothing('D', 'dead'), nothing('W', 'wind', { reversible: true })];
  expect(sums('asce-7-22-lrfd', cases)).toEqual(['1.4D', '1.2D+W', '1.2D−W', '0.9D+W', '0.9D−W']);
});

test('two winds are alternatives, two live loads add up', () => {
  const winds = [nothing('D', 'dead'), nothing('W1', 'wind'), nothing('W2', 'wind')];
  expect(sums('asce-7-22-lrfd', winds)).toEqual(['1.4D', '1.2D+W1', '1.2D+W2', '0.9D+W1', '0.9D+W2']);
  const lives = [nothing('D', 'dead'), nothing('La', 'live'), nothing('Lb', 'live')];
  expect(sums('asce-7-22-lrfd', lives)).toEqual(['1.4D', '1.2D+1.6La+1.6Lb']);
});

test('vertical earthquake adds to gravity and, with the least dead load, lifts', () => {
  const cases = [
    nothing('D', 'dead'),
    nothing('Eh', 'seismic', { reversible: true }),
    nothing('Ev', 'seismic', { category: 'vertical' }),
  ];
  expect(sums('asce-7-16-lrfd', cases)).toEqual([
    '1.4D',
    '1.2D+Eh+Ev',
    '1.2D−Eh+Ev',
    '0.9D+Eh−Ev',
    '0.9D−Eh−Ev',
  ]);
});

/** EN 1990:2002 6.10 with table A1.1, from memory: γG 1.35/1, γQ 1.5, ψ0 0.7 (B) and 0.6 (wind). */
test('lets every variable load of EN 1990 lead in turn', () => {
  const cases = [nothing('G', 'dead'), nothing('Q', 'live', { category: 'B' }), nothing('W', 'wind')];
  expect(sums('en-1990-6.10', cases)).toEqual([
    '1.35G+1.5Q+0.9W',
    '1.35G+1.5Q',
    'G+1.5Q+0.9W',
    'G+1.5Q',
    '1.35G+1.05Q+1.5W',
    '1.35G+1.5W',
    'G+1.05Q+1.5W',
    'G+1.5W',
    '1.35G',
    'G',
  ]);
  expect(sums('en-1990-6.10', cases, 'service')).toContain('G+0.3Q');
  expect(sums('en-1990-6.10ab', cases)).toContain('1.1475G+1.5Q+0.9W');
});

test('says which cases a set cannot hold', () => {
  const cases = [nothing('D', 'dead'), nothing('T', 'temperature'), nothing('Q', 'live')];
  const left = (key: string) => leftOut(cases, findSet(key) as NonNullable<ReturnType<typeof findSet>>);
  expect(left('asce-7-22-lrfd').map((l) => l.case)).toEqual(['T']);
  expect(left('en-1990-6.10')).toEqual([{ case: 'Q', reason: 'Case Q needs its category for ψ.' }]);
});

test('every combination has a name of its own, short enough for the form, and a source with its evidence', () => {
  const cases = [
    nothing('Dead', 'dead'),
    nothing('Live', 'live', { category: 'B' }),
    nothing('Snow', 'snow', { category: 'snow-low' }),
    nothing('Wind', 'wind', { reversible: true }),
    nothing('Temp', 'temperature', { reversible: true }),
  ];
  for (const set of publishedSets) {
    const found = combine(cases, set);
    expect(found.length).toBeGreaterThan(5);
    expect(new Set(found.map((c) => c.id)).size).toBe(found.length);
    for (const c of found) {
      expect(c.id.length).toBeLessThanOrEqual(24);
      expect(c.source).toMatch(/(seen|from memory)$|seen at second hand$/);
    }
  }
});

test('arranged live cases act only as arranged', () => {
  const cases = [nothing('D', 'dead'), nothing('L1', 'live'), nothing('L2', 'live')];
  expect(sums('asce-7-22-asd', cases, 'strength', [['L1', 'L2'], ['L1'], ['L2']])).toEqual([
    'D',
    'D+L1+L2',
    'D+L1',
    'D+L2',
    'D+0.75L1+0.75L2',
    'D+0.75L1',
    'D+0.75L2',
  ]);
});
