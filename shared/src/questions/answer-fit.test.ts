import { describe, expect, it, vi } from 'vitest';
import { FitAnswer, FitQuestion } from '../schemas/fit.ts';
import { answerFit } from './answer-fit.ts';
import type { HullPart, LowerUnitPart, MountPart, TransducerPart } from './parts.ts';

// A busy machine may take its time.
vi.setConfig({ testTimeout: 60_000 });

const hull: HullPart = { form: 'shallow-v', lengthM: 4.2, deadriseDeg: 8, transomAngleDeg: 13, material: 'aluminium', strakes: [] };
const motor: LowerUnitPart = { drive: 'outboard', powerHp: 25, rotation: 'right' };
const side: TransducerPart = { kinds: ['side'], housingLengthMm: 220 };
const bracket: MountPart = { kind: 'transom-bracket', tiltMinDeg: -20, tiltMaxDeg: 10, tiltZeroDeg: 0 };

interface Given {
  hull?: HullPart;
  motors?: { part: LowerUnitPart; offsetMm?: number; motorTrimDeg?: number }[];
  transducer?: TransducerPart;
  mount?: MountPart;
  placement?: object;
  running?: object;
  rest?: object;
}

function ask(given: Given = {}) {
  const parts = { hull, transducer: side, ...given, lowerUnits: (given.motors ?? [{ part: motor }]).map(({ part }) => part) };
  const question = FitQuestion.parse({
    hull: parts.hull,
    lowerUnits: (given.motors ?? [{ part: motor }]).map(({ part, ...setting }) => ({ lowerUnit: part, ...setting })),
    transducer: parts.transducer,
    mount: given.mount,
    placement: { offsetMm: 380, dropMm: 7, ...given.placement },
    running: { speedKn: 4, ...given.running },
    target: { attitudeDeg: 0 },
    uncertainty: 'none',
    ...given.rest,
  });
  return FitAnswer.parse(answerFit(question, { ...parts, mount: given.mount }, { edition: 7 }));
}
const codes = (answer: FitAnswer) => answer.reasons.map(({ code }) => code);

describe('a fit', () => {
  it('says the same for the same question, and something else for another', () => {
    expect(ask().answerDigest).toBe(ask().answerDigest);
    expect(ask({ running: { speedKn: 5 } }).answerDigest).not.toBe(ask().answerDigest);
    expect(ask({ rest: { ref: 'job 12' } })).toEqual({ ...ask(), ref: 'job 12' });
  });

  it('levels the sensor by as much as the boat trims, and reads that on the bracket', () => {
    const { tilt, trim } = ask({ mount: bracket, running: { measuredTrimDeg: 3, measuredSigmaDeg: 0.4 } });
    expect(trim).toEqual({ valueDeg: 3, sigmaDeg: 0.5, basis: 'yours', flags: [] });
    expect(tilt).toMatchObject({ neededDeg: -3, setDeg: -3, attitudeDeg: 0, bracketSettingDeg: -16, inBracketRange: true, wedgeDeg: 0 });
  });

  it('closes a gap of the scale with a wedge that turns the sensor nose-down', () => {
    const mount = { ...bracket, tiltMinDeg: -14 };
    const answer = ask({ mount, motors: [{ part: motor, motorTrimDeg: 70 }], running: { measuredTrimDeg: 4, measuredSigmaDeg: 0.4 } });
    expect(answer.tilt).toMatchObject({ bracketSettingDeg: -17, inBracketRange: false, wedgeDeg: -3 });
    expect(answer.tilt.shimMmPer100).toBeCloseTo(5.2408, 3);
    expect([answer.verdict, answer.action.code]).toEqual(['fits-with-care', 'add-wedge']);
    expect(codes(answer)).toContain('tilt-out-of-range');
  });

  it('reads a setting on the bracket as nose-up from square to the transom face', () => {
    const mount = { ...bracket, tiltZeroDeg: 2 };
    expect(ask({ mount, placement: { bracketSettingDeg: -10 } }).tilt.setDeg).toBeCloseTo(-10 + 13 + 2, 9);
  });

  it('names the torpedo as what hides the port side of a short boat', () => {
    const answer = ask();
    expect(answer.clearance.port?.verdict).toBe('blocked');
    expect(answer.clearance.port?.sectors.find(({ kind }) => kind === 'hidden')?.by.unit).toBe(0);
    expect(answer.clearance.port?.sectors.map(({ by }) => by.part)).toContain('torpedo');
    expect(codes(answer)).toContain('side-blocked');
    expect(answer.verdict).toBe('fits-with-care');
  });

  it('fits with the motor tilted clear', () => {
    const answer = ask({ motors: [{ part: motor, motorTrimDeg: 70 }] });
    expect(answer.verdict).toBe('fits');
    expect(answer.action.code).toBe('leave');
    expect(answer.clearance.tiltWindowDeg).toEqual([-20, 20]);
  });

  it('counts only the wanted side', () => {
    expect(ask({ rest: { wanted: 'starboard' } }).verdict).toBe('fits');
    expect(ask({ rest: { wanted: 'port' } }).verdict).toBe('fits-with-care');
  });

  it('does not fit where a twin hides a side at every setting', () => {
    const twins = [-330, 330].map((offsetMm) => ({ part: { ...motor, powerHp: 150, trimMaxDeg: 2, trimMinDeg: -6 }, offsetMm }));
    const answer = ask({ motors: twins, placement: { offsetMm: 0, standoffMm: 250 } });
    expect(codes(answer)).toContain('blocked-at-every-setting');
    expect(answer.verdict).toBe('does-not-fit');
  });

  it('answers without any engine, and says whose thrust it took', () => {
    const answer = ask({ motors: [] });
    expect(answer.clearance.port?.clearShare).toBe(1);
    expect(answer.assumptions.map(({ field }) => field)).toContain('lowerUnits');
  });

  it.each([
    ['pontoon', { form: 'pontoon', lengthM: 7 }],
    ['stepped', { ...hull, steps: 2 }],
  ] as [string, HullPart][])('cannot tell for a %s hull until the local bottom is stated', (_, other) => {
    const unstated = ask({ hull: other, motors: [] });
    expect([unstated.verdict, unstated.action.code]).toEqual(['cannot-tell', 'measure-first']);
    expect(codes(unstated)).toContain('local-bottom-unknown');
    expect(unstated.trim.basis).toBe('class');
    expect(ask({ hull: other, motors: [], placement: { localBottomMm: 0 } }).verdict).not.toBe('cannot-tell');
  });

  it('cannot tell for a sensor inside the motor, and still gives numbers', () => {
    const answer = ask({ placement: { offsetMm: 0, standoffMm: 200, dropMm: 150 } });
    expect(answer.verdict).toBe('cannot-tell');
    expect(codes(answer)).toContain('sensor-inside-part');
    // JSON turns NaN into null: no number of the trim or the sides may be one.
    expect(Object.values(answer.trim)).not.toContain(null);
    expect(Number.isFinite(answer.clearance.port?.clearShare)).toBe(true);
  });

  it('sees an obstacle by its label', () => {
    const ladder = { label: 'ladder', xMm: -200, yMm: 900, zMm: 100, lengthMm: 600, widthMm: 60, heightMm: 600 };
    const answer = ask({ rest: { obstacles: [ladder] } });
    expect(answer.clearance.starboard?.sectors[0]?.by).toEqual({ unit: null, part: 'obstacle', label: 'ladder' });
  });

  it('has no sides for a transducer that only looks down, and minds its attitude', () => {
    const answer = ask({ transducer: { kinds: ['cone'], coneBeamDeg: 20 }, placement: { tiltDeg: 8 } });
    expect([answer.clearance.port, answer.clearance.starboard]).toEqual([null, null]);
    expect(answer.flow.find(({ rule }) => rule === 'down-attitude')?.outcome).toBe('caution');
  });

  it('answers other states with the same tilt', () => {
    const { states, tilt } = ask({ rest: { alsoAt: [{ label: 'cruise', speedKn: 18, motorTrimDeg: 70 }] } });
    expect(states[0]?.attitudeDeg).toBeCloseTo(tilt.setDeg + (states[0]?.trim.valueDeg ?? 0), 5);
    expect(states[0]?.clearance.port?.clearShare).toBe(1);
  });

  it('lists every default it took', () => {
    const fields = ask().assumptions.map(({ field }) => field);
    expect(fields).toContain('lowerUnits.0.torpedoDiameterMm');
    expect(fields).toContain('hull.loadedMassKg');
    expect(fields).not.toContain('hull.deadriseDeg');
  });
});

describe('a sampled fit', () => {
  const sampled = ask({ rest: { uncertainty: 'sampled' } });

  it('is the same every time', () => expect(ask({ rest: { uncertainty: 'sampled' } })).toEqual(sampled));

  it('bounds the needed tilt on both sides', () => {
    const [low, high] = sampled.tilt.interval90Deg as [number, number];
    expect(low).toBeLessThan(sampled.tilt.neededDeg);
    expect(high).toBeGreaterThan(sampled.tilt.neededDeg);
  });

  it('is sure of a blocked port and a clear starboard side', () => {
    expect(sampled.clearance.port?.probabilityClear).toBe(0);
    expect(sampled.clearance.starboard?.probabilityClear).toBe(1);
  });

  it('asks for the running trim to be measured, which narrows the interval', () => {
    expect(sampled.nextMeasurement?.name).toBe('running.measuredTrimDeg');
    const [low, high] = sampled.tilt.interval90Deg as [number, number];
    const [lowAfter, highAfter] = sampled.nextMeasurement?.interval90DegAfter ?? [low, high];
    expect(highAfter - lowAfter).toBeLessThan(high - low);
  });

  it('widens where figures are missing', () => {
    const stated = { ...hull, beamM: 1.7, chineBeamM: 1.4, dryMassKg: 190, loadedMassKg: 420, lcgM: 1.6, vcgM: 0.37, staticTrimDeg: 0.5 };
    const width = ({ tilt }: FitAnswer) => (tilt.interval90Deg as [number, number])[1] - (tilt.interval90Deg as [number, number])[0];
    const at = { running: { speedKn: 18 }, rest: { uncertainty: 'sampled' } };
    expect(width(ask(at))).toBeGreaterThan(width(ask({ ...at, hull: stated })));
  });

  it('cannot tell where a side may be blocked as well as clear', () => {
    const answer = ask({ motors: [{ part: motor, motorTrimDeg: 14 }], rest: { uncertainty: 'sampled' } });
    expect(answer.verdict).toBe('cannot-tell');
    expect(codes(answer)).toContain('blocked-or-clear');
    expect(answer.dominantInput?.name).toMatch(/^lowerUnits\.0\./);
  });
});

describe('advice to re-tilt', () => {
  const free = { motors: [{ part: motor, motorTrimDeg: 70 }], running: { measuredTrimDeg: 3, measuredSigmaDeg: 0.4 } };

  it('is given where the gain exceeds the tilt’s own interval', () => {
    expect(ask({ ...free, placement: { tiltDeg: 0 } }).action.code).toBe('re-tilt');
  });

  it('is kept back where the change drowns in the uncertainty', () => {
    expect(ask({ ...free, placement: { tiltDeg: -2.6 } }).action.code).toBe('leave');
  });
});
