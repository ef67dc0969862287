import { describe, expect, it } from 'vitest';
import * as flow from './flow.ts';
import { degToRad } from './units.ts';

const fast = 8;
const slow = 2;

// Common practice, no source.
describe('rules of the water flow', () => {
  it.each([
    [0.005, 'glass-fibre', 'ok'],
    [0.0075, 'glass-fibre', 'caution'],
    [0.0075, 'aluminium', 'ok'],
    [0.004, 'aluminium', 'caution'],
    [0.013, 'aluminium', 'caution'],
    [0.005, null, 'ok'],
  ] as const)('an edge %f m below a %s bottom: %s', (dropM, material, outcome) =>
    expect(flow.edgeBelowBottom(dropM, material).outcome).toBe(outcome),
  );

  it.each([
    [-4, fast, 'caution'],
    [3, fast, 'ok'],
    [9, fast, 'caution'],
    [-4, slow, 'ok'],
  ] as const)('a tilt of %i° at %i m/s: %s', (tiltDeg, speed, outcome) =>
    expect(flow.tiltForFlow(degToRad(tiltDeg), speed).outcome).toBe(outcome),
  );

  it('keeps 380 mm from the propeller’s axis, or 50 mm from a large one', () => {
    expect(flow.propellerDistance(0.38, 0.12).outcome).toBe('ok');
    expect(flow.propellerDistance(0.37, 0.12).outcome).toBe('caution');
    expect(flow.propellerDistance(0.38, 0.35).outcome).toBe('caution');
  });

  it('prefers starboard of a right-hand propeller without insisting', () => {
    expect(flow.bladeSide('right', true).text).toContain('preferred');
    expect(flow.bladeSide('right', false)).toMatchObject({ outcome: 'ok', text: expect.stringContaining('disputed') });
    expect(flow.bladeSide(null, true).outcome).toBe('unknown');
  });

  it('keeps 75 mm from strakes, and does not take silence for none', () => {
    expect([null, 0.05, 0.08, Number.POSITIVE_INFINITY].map((gap) => flow.strakeDistance(gap).outcome)).toEqual([
      'unknown',
      'caution',
      'ok',
      'ok',
    ]);
  });

  it('wants one stated speed within 3 to 10 km/h for side-looking', () => {
    expect(flow.sideSpeed([fast, 1.5]).outcome).toBe('ok');
    expect(flow.sideSpeed([fast]).outcome).toBe('caution');
  });

  it('lets a fan lean by half its along-track width and a cone by a quarter of its width', () => {
    expect(flow.downAttitude(degToRad(2), false, [0.01]).outcome).toBe('ok');
    expect(flow.downAttitude(degToRad(2), false, [0.01, -0.02]).outcome).toBe('caution');
    expect(flow.downAttitude(degToRad(20), true, [degToRad(4.9)]).outcome).toBe('ok');
    expect(flow.downAttitude(degToRad(20), true, [degToRad(5.1)]).outcome).toBe('caution');
  });

  it('runs dry above the bottom line at speed', () => {
    expect(flow.immersion([0.006, 0.02], fast).outcome).toBe('ok');
    expect(flow.immersion([0.006, -0.01], fast).outcome).toBe('caution');
    expect(flow.immersion([-0.02, -0.01], fast).text).toContain('dry');
    expect(flow.immersion([-0.02, -0.01], slow).outcome).toBe('ok');
  });

  it('takes a roll of 2° for level', () => {
    expect([1.9, -2.1].map((rollDeg) => flow.rollLevel(degToRad(rollDeg)).outcome)).toEqual(['ok', 'caution']);
  });
});
