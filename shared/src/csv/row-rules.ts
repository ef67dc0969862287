// What one row's values must agree on (errors) and what is odd enough for a second look (cautions).
import type { Table } from '../schemas/catalog-record.ts';
import { columnOfField } from './columns.ts';

export interface RuleBreach {
  column: string;
  code: string;
  message: string;
}

type Values = Readonly<Record<string, unknown>>;

function number(values: Values, field: string): number | undefined {
  const value = values[field];
  return typeof value === 'number' ? value : undefined;
}

interface Order {
  low: string;
  high: string;
  code: string;
  /** True where equal values are wrong too. */
  strict?: boolean;
  /** How many units of `low` make one of `high`. */
  scale?: number;
}

const years: Order = { low: 'yearFrom', high: 'yearTo', code: 'years-order' };
const orders: Readonly<Record<Table, readonly Order[]>> = {
  hulls: [
    years,
    { low: 'beamM', high: 'lengthM', code: 'beam-over-length', strict: true },
    { low: 'chineBeamM', high: 'beamM', code: 'chine-over-beam' },
    { low: 'chineBeamM', high: 'lengthM', code: 'chine-over-length', strict: true },
    { low: 'lcgM', high: 'lengthM', code: 'lcg-over-length', strict: true },
    { low: 'keelPadMm', high: 'chineBeamM', code: 'pad-over-chine', scale: 1000 },
  ],
  'lower-units': [
    years,
    { low: 'trimMinDeg', high: 'trimMaxDeg', code: 'min-over-max' },
    { low: 'trimMaxDeg', high: 'tiltMaxDeg', code: 'min-over-max' },
    { low: 'trimMinDeg', high: 'tiltMaxDeg', code: 'min-over-max' },
  ],
  transducers: [years],
  mounts: [
    years,
    { low: 'tiltMinDeg', high: 'tiltMaxDeg', code: 'min-over-max' },
    { low: 'rollMinDeg', high: 'rollMaxDeg', code: 'min-over-max' },
    { low: 'heightMinMm', high: 'heightMaxMm', code: 'min-over-max' },
    { low: 'deadriseMinDeg', high: 'deadriseMaxDeg', code: 'min-over-max' },
  ],
  'trim-points': [],
};

/** The hard rules between the cells of one row. */
export function hardRules(table: Table, values: Values): RuleBreach[] {
  const breaches: RuleBreach[] = [];
  for (const { low, high, code, strict, scale = 1 } of orders[table]) {
    const [a, b] = [number(values, low), number(values, high)];
    if (a === undefined || b === undefined || a < b * scale || (!strict && a === b * scale)) continue;
    const [column, other] = [columnOfField(low), columnOfField(high)];
    const relation = strict ? 'must be below' : 'must not be above';
    breaches.push({ column, code, message: `${column} ${a} ${relation} ${other} ${b}.` });
  }
  return breaches;
}

// Everything below is common practice, no source: wide brackets that a good row of the trade does not leave.

/** Dry mass over length cubed, kg/m³: light inflatables about 1, planing boats 2 to 5, heavy workboats about 8. */
const dryDensity = { least: 0.4, most: 14 };
/** Loaded, people and motor weigh a small boat down: up to 30 on a 1.8 m dinghy. */
const loadedDensity = { least: 0.8, most: 40 };
/** Boats under way are 0.25 to 0.5 as wide as long; dinghies and pontoons a little beyond. */
const beamShare = { least: 0.15, most: 0.7 };
/** Deadrise in degrees by form. Half a degree of play on each bound. */
const deadriseByForm: Readonly<Record<string, readonly [number, number]>> = {
  flat: [0, 2.5],
  'shallow-v': [0, 16.5],
  'modified-v': [11.5, 20.5],
  'deep-v': [18.5, 30],
};
/** A sound tip clearance leaves the propeller below the plate. */
const tipClearanceMm = 0;

function outside(value: number, { least, most }: { least: number; most: number }): boolean {
  return value < least || value > most;
}

function hullCautions(values: Values, add: (field: string, code: string, message: string) => void): void {
  const [length, beam, deadrise] = [number(values, 'lengthM'), number(values, 'beamM'), number(values, 'deadriseDeg')];
  const [dry, loaded] = [number(values, 'dryMassKg'), number(values, 'loadedMassKg')];
  if (length !== undefined) {
    if (dry !== undefined && outside(dry / length ** 3, dryDensity)) {
      add('dryMassKg', 'mass-against-length', `${dry} kg dry is unusual for a hull of ${length} m.`);
    }
    if (loaded !== undefined && outside(loaded / length ** 3, loadedDensity)) {
      add('loadedMassKg', 'mass-against-length', `${loaded} kg loaded is unusual for a hull of ${length} m.`);
    }
    if (beam !== undefined && beam < length && outside(beam / length, beamShare)) {
      add('beamM', 'beam-against-length', `A beam of ${beam} m is unusual for a hull of ${length} m.`);
    }
  }
  if (dry !== undefined && loaded !== undefined && loaded < dry) {
    add('loadedMassKg', 'loaded-under-dry', `Loaded (${loaded} kg) is lighter than dry (${dry} kg).`);
  }
  const usual = typeof values.form === 'string' ? deadriseByForm[values.form] : undefined;
  if (deadrise !== undefined && usual && (deadrise < usual[0] || deadrise > usual[1])) {
    add('deadriseDeg', 'deadrise-against-form', `${deadrise}° is unusual for a ${values.form} hull.`);
  }
  const halfChineMm = (number(values, 'chineBeamM') ?? Number.POSITIVE_INFINITY) * 500;
  for (const strake of Array.isArray(values.strakes) ? (values.strakes as string[]) : []) {
    if (Number.parseFloat(strake) > halfChineMm) add('strakes', 'strake-outside-chine', `The strake ${strake} lies outside the chine.`);
  }
}

function lowerUnitCautions(values: Values, add: (field: string, code: string, message: string) => void): void {
  const [prop, plate] = [number(values, 'propDiameterMm'), number(values, 'plateAboveShaftMm')];
  if (prop !== undefined && plate !== undefined && plate - prop / 2 <= tipClearanceMm) {
    add('propDiameterMm', 'propeller-against-plate', `A propeller of ${prop} mm would strike a plate ${plate} mm above its shaft.`);
  }
  const [diameter, length] = [number(values, 'torpedoDiameterMm'), number(values, 'torpedoLengthMm')];
  if (diameter !== undefined && length !== undefined && diameter >= length) {
    add('torpedoDiameterMm', 'torpedo-shape', `A torpedo of ${diameter} mm diameter is longer than it is thick, not ${length} mm.`);
  }
  if (values.drive === 'sterndrive' && values.shaftLengthMm !== undefined) {
    add('shaftLengthMm', 'shaft-of-sterndrive', 'A sterndrive states plate_below_keel_mm instead of a shaft length.');
  }
}

function transducerCautions(values: Values, add: (field: string, code: string, message: string) => void): void {
  const kinds = Array.isArray(values.kinds) ? (values.kinds as string[]) : undefined;
  if (!kinds) return;
  for (const kind of ['side', 'down', 'cone']) {
    const stated = Object.keys(values).find((field) => field.startsWith(kind) && values[field] !== undefined);
    if (stated && !kinds.includes(kind))
      add(stated, 'element-not-named', `${columnOfField(stated)} is stated, but kinds does not name ${kind}.`);
  }
}

/** Oddities within one row that a person should look at; they never refuse it. */
export function cautionsOf(table: Table, values: Values): RuleBreach[] {
  const cautions: RuleBreach[] = [];
  const add = (field: string, code: string, message: string) => {
    cautions.push({ column: columnOfField(field), code, message });
  };
  if (table === 'hulls') hullCautions(values, add);
  else if (table === 'lower-units') lowerUnitCautions(values, add);
  else if (table === 'transducers') transducerCautions(values, add);
  return cautions;
}
