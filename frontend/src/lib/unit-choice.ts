import { storedChoice } from './stored-choice.ts';

export const lengthUnits = ['mm', 'in'] as const;
export const speedUnits = ['kn', 'km/h', 'mph'] as const;
export const massUnits = ['kg', 'lb'] as const;

/** The units a person reads and types in; the product itself keeps mm, m, kn and kg. */
export interface UnitChoice {
  length: (typeof lengthUnits)[number];
  speed: (typeof speedUnits)[number];
  mass: (typeof massUnits)[number];
}

export const metricUnits: UnitChoice = { length: 'mm', speed: 'kn', mass: 'kg' };

const choice = storedChoice<UnitChoice>('tiltwright.units', (stored) => {
  const given = (typeof stored === 'object' && stored !== null ? stored : {}) as Partial<Record<keyof UnitChoice, unknown>>;
  return {
    length: lengthUnits.find((unit) => unit === given.length) ?? metricUnits.length,
    speed: speedUnits.find((unit) => unit === given.speed) ?? metricUnits.speed,
    mass: massUnits.find((unit) => unit === given.mass) ?? metricUnits.mass,
  };
});

export const useUnits = choice.use;
export const setUnits = choice.set;
