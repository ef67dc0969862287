// What riggers know of a short aluminium boat with the sensor 380 mm to starboard. Common practice, no source.
import { describe, expect, it, vi } from 'vitest';
import { clearsAtDeg, shortBoat } from '../support/short-boat.ts';

const powers = [15, 25, 40];

// A busy machine may take its time.
vi.setConfig({ testTimeout: 60_000 });

describe('a short aluminium boat (common practice, no source)', () => {
  it.each(powers)('with %i hp at motor trim 0 has its port side about half hidden, its starboard side clear', (powerHp) => {
    const { port, starboard } = shortBoat({ powerHp });
    expect(port.clearShare).toBeGreaterThan(0.25);
    expect(port.clearShare).toBeLessThan(0.75);
    expect(starboard.verdict).toBe('clear');
  });

  it.each(powers)('with %i hp hides more below trim 0', (powerHp) => {
    expect(shortBoat({ powerHp, motorTrimDeg: -4 }).port.clearShare).toBeLessThan(shortBoat({ powerHp }).port.clearShare);
  });

  it.each(powers)('with %i hp clears its port side only above about 12 to 18° of motor trim', (powerHp) => {
    expect(clearsAtDeg({ powerHp })).toBeGreaterThanOrEqual(11);
    expect(clearsAtDeg({ powerHp })).toBeLessThanOrEqual(19);
  });

  it('needs more than 20° with a housing of 290 mm, so full trim can be too little', () => {
    expect(clearsAtDeg({ housingLengthMm: 290 })).toBeGreaterThanOrEqual(20);
    expect(clearsAtDeg({ housingLengthMm: 290, standoffMm: 60 })).toBeGreaterThan(21);
  });

  it('sees more past the motor nose-up than nose-down', () => {
    expect(shortBoat({ motorTrimDeg: 8, tiltDeg: 6 }).port.clearShare).toBeGreaterThan(
      shortBoat({ motorTrimDeg: 8, tiltDeg: -6 }).port.clearShare,
    );
  });

  it('loses several per cent when a board moves the sensor 15 mm aft', () => {
    const lost = shortBoat({ motorTrimDeg: 8 }).port.clearShare - shortBoat({ motorTrimDeg: 8, standoffMm: 45 }).port.clearShare;
    expect(lost).toBeGreaterThan(0.02);
    expect(lost).toBeLessThan(0.12);
  });

  it('gains by 1° of motor trim about what 3 to 4° of tilt gain', () => {
    const gainOf = (changes: { motorTrimDeg: number; tiltDeg?: number }) => shortBoat(changes).port.clearShare;
    const byTrim = (gainOf({ motorTrimDeg: 10 }) - gainOf({ motorTrimDeg: 6 })) / 4;
    const byTilt = (gainOf({ motorTrimDeg: 8, tiltDeg: 6 }) - gainOf({ motorTrimDeg: 8, tiltDeg: -6 })) / 12;
    expect(byTrim / byTilt).toBeGreaterThan(2);
    expect(byTrim / byTilt).toBeLessThan(6);
  });

  it('is free on both sides with the motor tilted clear', () => {
    const { port, starboard } = shortBoat({ motorTrimDeg: 70 });
    expect([port.clearShare, starboard.clearShare]).toEqual([1, 1]);
  });
});
