import type { Sector, SideAnswer } from '@tiltwright/shared/schemas/answer.ts';
import { describe, expect, it } from 'vitest';
import { fieldWords } from './field-words.ts';
import { type FitState, standardState } from './fit-state.ts';
import { greatestHider, headline } from './verdict-words.ts';

const side = (clearShare: number, sectors: Sector[] = []): SideAnswer => ({
  verdict: clearShare >= 0.99 ? 'clear' : clearShare >= 0.85 ? 'shaded' : 'blocked',
  clearShare,
  probabilityClear: null,
  sectors,
  leastClearanceMm: null,
  diffractionMarginMm: null,
});
const sector = (part: Sector['by']['part'], share: number, unit = 0): Sector => ({
  fromDeg: 2,
  toDeg: 30,
  share,
  kind: 'hidden',
  by: { unit, part },
});
const say = (port: SideAnswer | null, starboard: SideAnswer | null, changes: Partial<FitState> = {}) =>
  headline(
    { ...standardState, ...changes },
    { verdict: 'fits-with-care', clearance: { port, starboard, tiltWindowDeg: null, nearestClearTiltDeg: null } },
  );

describe('the head of the answer', () => {
  it('says which side is hidden, how much and by what', () => {
    expect(say(side(0.36, [sector('strut', 0.5), sector('torpedo', 0.14)]), side(1))).toBe('The port side is mostly hidden by the strut.');
  });

  it('adds up the sectors of one part', () => {
    const picture = side(0.5, [sector('torpedo', 0.2), sector('strut', 0.15), sector('strut', 0.15)]);
    expect(greatestHider(picture, standardState)).toBe('strut');
  });

  it('takes what hides before what only thins', () => {
    const thinned: Sector = { ...sector('strut', 0.4), kind: 'thinned' };
    expect(greatestHider(side(0.5, [thinned, sector('torpedo', 0.2)]), standardState)).toBe('torpedo');
    expect(greatestHider(side(0.9, [thinned]), standardState)).toBe('strut');
  });

  it('names the motor where there are two', () => {
    expect(say(side(1), side(0.7, [sector('skeg', 0.3, 1)]), { motors: 'two' })).toBe(
      'The starboard side is partly hidden by the skeg of the starboard motor.',
    );
  });

  it('speaks of the wanted side alone', () => {
    expect(say(side(0.2, [sector('strut', 0.8)]), side(1), { wanted: 'starboard' })).toBe('The starboard side looks out freely.');
  });

  it('says so where there is no side picture', () => {
    expect(say(null, null)).toBe('There is no side-looking picture to judge.');
  });
});

describe('field paths in words', () => {
  it.each([
    ['hull.transomAngleDeg', 'boat', 'transom angle', 'angleDeg'],
    ['hull.lcgM', 'boat', 'centre of gravity, ahead of the transom', 'lengthM'],
    ['lowerUnits.1.swivelAftMm', 'starboard motor', 'swivel aft', 'lengthMm'],
    ['lowerUnits.0.bladeAreaRatio', 'port motor', 'blade area ratio', 'plain'],
    ['lowerUnits.0.propDiameterMm', 'port motor', 'propeller diameter', 'lengthMm'],
    ['lowerUnits.0.tiltMaxDeg', 'port motor', 'full motor tilt', 'angleDeg'],
    ['mount.tiltMaxDeg', 'mount', 'greatest tilt on the scale', 'angleDeg'],
    ['transducer.sideFrequencyKhz', 'sensor', 'side frequency', 'frequencyKhz'],
  ])('%s', (path, subject, name, quantity) => {
    expect(fieldWords(path, { motors: 'two' })).toEqual({ subject, name, quantity });
  });
});
