import { describe, expect, it } from 'vitest';
import { FitQuestion } from '../schemas/fit.ts';
import { answerFit } from './answer-fit.ts';
import { compatibilityRules } from './compatibility.ts';
import type { HullPart, LowerUnitPart, MountPart, TransducerPart } from './parts.ts';

const hull: HullPart = { form: 'modified-v', lengthM: 5.2, deadriseDeg: 17, material: 'aluminium', transomHeightMm: 508, chineBeamM: 1.8 };
const motor: LowerUnitPart = { drive: 'outboard', powerHp: 90, shaftLengthMm: 508 };
const transducer: TransducerPart = { kinds: ['side'], housingLengthMm: 220, housingWidthMm: 50, mountKinds: ['transom-bracket'] };
const mount: MountPart = {
  kind: 'transom-bracket',
  tiltMinDeg: -25,
  tiltMaxDeg: 10,
  hullMaterials: ['aluminium', 'glass-fibre'],
  deadriseMinDeg: 0,
  deadriseMaxDeg: 22,
  rollMinDeg: -25,
  rollMaxDeg: 25,
  heightMinMm: 0,
  heightMaxMm: 40,
  plateWidthMm: 120,
  plateHeightMm: 150,
  housingLengthMaxMm: 260,
  housingWidthMaxMm: 60,
  maxSpeedKn: 40,
};

interface Given {
  hull?: Partial<HullPart>;
  motor?: Partial<LowerUnitPart>;
  transducer?: Partial<TransducerPart>;
  mount?: Partial<MountPart>;
  placement?: object;
  running?: object;
}

function outcomes(given: Given = {}) {
  const parts = {
    hull: { ...hull, ...given.hull },
    lowerUnits: [{ ...motor, ...given.motor }],
    transducer: { ...transducer, ...given.transducer },
    mount: { ...mount, ...given.mount },
  };
  const question = FitQuestion.parse({
    hull: parts.hull,
    lowerUnits: [{ lowerUnit: parts.lowerUnits[0] }],
    transducer: parts.transducer,
    mount: parts.mount,
    placement: { offsetMm: 600, dropMm: 7, ...given.placement },
    running: { speedKn: 4, ...given.running },
    target: { attitudeDeg: 0 },
    uncertainty: 'none',
  });
  const answer = answerFit(question, parts, { edition: 0 });
  return { verdict: answer.verdict, ...Object.fromEntries(answer.compatibility.map(({ rule, outcome }) => [rule, outcome])) };
}

describe('compatibility', () => {
  it('is all well for parts that go together', () => {
    const { verdict, ...rules } = outcomes();
    expect(new Set(Object.values(rules))).toEqual(new Set(['ok']));
    expect(verdict).not.toBe('does-not-fit');
  });

  it('knows only rules of its closed list', () => {
    const { verdict: _, ...rules } = outcomes();
    for (const rule of Object.keys(rules)) expect(Object.keys(compatibilityRules)).toContain(rule);
  });

  it.each([
    ['mount-kind', { transducer: { mountKinds: ['in-hull'] } }, 'no'],
    ['mount-kind', { transducer: { mountKinds: undefined } }, 'unknown'],
    ['hull-material', { hull: { material: 'inflatable' } }, 'no'],
    ['hull-material', { hull: { material: undefined } }, 'unknown'],
    ['deadrise-range', { hull: { deadriseDeg: 24 } }, 'no'],
    ['tilt-range', { mount: { tiltMinDeg: -5 } }, 'caution'],
    ['roll-range', { mount: { rollMaxDeg: 3 }, placement: { rollDeg: 4 } }, 'no'],
    ['height-range', { placement: { dropMm: 60 } }, 'no'],
    ['plate-fits', { placement: { offsetMm: 880 } }, 'no'],
    ['plate-fits', { mount: { plateHeightMm: 600 } }, 'no'],
    ['plate-fits', { hull: { strakes: ['620:100'] } }, 'caution'],
    ['housing-fits', { transducer: { housingLengthMm: 270 } }, 'no'],
    ['housing-fits', { transducer: { housingWidthMm: 70 } }, 'no'],
    ['mount-speed', { running: { speedKn: 45 } }, 'no'],
    ['transducer-speed', { transducer: { maxSpeedKn: 30 }, running: { speedKn: 35 } }, 'caution'],
    ['engine-swing', { placement: { offsetMm: 0, standoffMm: 150, dropMm: 100 } }, 'no'],
    ['shaft-length', { motor: { shaftLengthMm: 548 } }, 'caution'],
    ['shaft-length', { motor: { shaftLengthMm: 635 } }, 'no'],
    ['local-bottom', { hull: { steps: 1 } }, 'unknown'],
    ['local-bottom', { hull: { steps: 1 }, placement: { localBottomMm: -20 } }, 'ok'],
  ] as [string, Given, string][])('%s, case %#', (rule, given, outcome) => {
    expect(outcomes(given)).toMatchObject({ [rule]: outcome });
  });

  it('lets a no decide', () => {
    expect(outcomes({ hull: { material: 'inflatable' } }).verdict).toBe('does-not-fit');
  });

  it('asks for a fairing under a through-hull unit on a vee', () => {
    const throughHull = { kind: 'through-hull', deadriseMinDeg: undefined, deadriseMaxDeg: undefined } as const;
    expect(outcomes({ mount: throughHull, placement: { forwardMm: 1200 } })).toMatchObject({ 'deadrise-range': 'caution' });
  });
});
