// Numbers as a person reads them: the chosen unit beside each number, a real minus sign, figures no finer than they are known.
import type { UnitChoice } from './unit-choice.ts';

/** Exact by definition (international yard and pound agreement of 1959; international nautical mile). */
const mmPerInch = 25.4;
const inchesPerFoot = 12;
const kmhPerKnot = 1.852;
const mphPerKnot = 1852 / 1609.344;
const poundsPerKg = 1 / 0.45359237;

/** What a number measures; its stored unit is in the name. */
export type Quantity = 'lengthMm' | 'lengthM' | 'speedKn' | 'massKg' | 'angleDeg' | 'powerHp' | 'frequencyKhz' | 'levelDb' | 'plain';

/** Unit as it stands behind the number; boat lengths in inches are written in feet and inches. */
export function unitWord(quantity: Quantity, units: UnitChoice): string {
  switch (quantity) {
    case 'lengthMm':
      return units.length;
    case 'lengthM':
      return units.length === 'mm' ? 'm' : 'ft';
    case 'speedKn':
      return units.speed;
    case 'massKg':
      return units.mass;
    case 'angleDeg':
      return '°';
    case 'powerHp':
      return 'hp';
    case 'frequencyKhz':
      return 'kHz';
    case 'levelDb':
      return 'dB';
    case 'plain':
      return '';
    default:
      return quantity satisfies never;
  }
}

/** From the stored unit to the shown one. */
export function toShown(value: number, quantity: Quantity, units: UnitChoice): number {
  if (quantity === 'lengthMm' && units.length === 'in') return value / mmPerInch;
  if (quantity === 'lengthM' && units.length === 'in') return (value * 1000) / mmPerInch / inchesPerFoot;
  if (quantity === 'speedKn') return value * speedFactor(units);
  if (quantity === 'massKg' && units.mass === 'lb') return value * poundsPerKg;
  return value;
}

/** From the shown unit back to the stored one. */
export function fromShown(value: number, quantity: Quantity, units: UnitChoice): number {
  return value / toShown(1, quantity, units);
}

function speedFactor(units: UnitChoice): number {
  return units.speed === 'kn' ? 1 : units.speed === 'km/h' ? kmhPerKnot : mphPerKnot;
}

/** Decimals that a tape, a level or a log can tell apart. */
function decimalsOf(quantity: Quantity, units: UnitChoice): number {
  switch (quantity) {
    case 'lengthMm':
      return units.length === 'mm' ? 0 : 2;
    case 'lengthM':
      return units.length === 'mm' ? 2 : 1;
    case 'speedKn':
    case 'angleDeg':
      return 1;
    case 'powerHp':
    case 'massKg':
    case 'frequencyKhz':
    case 'levelDb':
      return 0;
    case 'plain':
      return 2;
    default:
      return quantity satisfies never;
  }
}

/** Fixed decimals, minus sign U+2212, no "−0". */
export function formatNumber(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? `−${text}` : text;
}

/** At most so many decimals: 4, 4.5, but not 4.0. */
export function formatShort(value: number, decimals: number): string {
  const text = formatNumber(value, decimals);
  return text.includes('.') ? text.replace(/\.?0+$/, '') : text;
}

function withUnit(text: string, unit: string): string {
  // A degree sign stands close, every other unit behind a no-break space.
  if (unit === '') return text;
  return unit === '°' ? `${text}°` : `${text}\u00a0${unit}`;
}

/** "380 mm", "4.1°", "16 ft 8 in". */
export function formatQuantity(value: number, quantity: Quantity, units: UnitChoice): string {
  if (quantity === 'lengthM' && units.length === 'in') return feetAndInches(value);
  const decimals = decimalsOf(quantity, units);
  const shown = toShown(value, quantity, units);
  const text = quantity === 'angleDeg' ? formatNumber(shown, decimals) : formatShort(shown, decimals);
  return withUnit(text, unitWord(quantity, units));
}

function feetAndInches(lengthM: number): string {
  const inches = Math.round((Math.abs(lengthM) * 1000) / mmPerInch);
  const feet = Math.floor(inches / inchesPerFoot);
  const rest = inches % inchesPerFoot;
  const sign = lengthM < 0 && inches > 0 ? '−' : '';
  return `${sign}${feet}\u00a0ft${rest > 0 ? ` ${rest}\u00a0in` : ''}`;
}

/** "4.1° ± 1.0": both with the same decimals, sigma never shown as an exact zero. */
export function formatEstimate(value: number, sigma: number | null, quantity: Quantity, units: UnitChoice): string {
  const text = formatQuantity(value, quantity, units);
  if (sigma === null) return text;
  const feet = quantity === 'lengthM' && units.length === 'in';
  const decimals = feet ? 1 : decimalsOf(quantity, units);
  // A boat length is written in feet and inches, its uncertainty in feet.
  const shown = toShown(sigma, quantity, units);
  const least = 10 ** -decimals;
  const spread = shown > 0 && shown < least ? `under ${formatNumber(least, decimals)}` : formatNumber(shown, decimals);
  return `${text} ± ${spread}${feet ? '\u00a0ft' : ''}`;
}

/** Both words of the trade for one angle: "nose-up 2.0° (heel-down 2.0°)". */
export function formatTilt(tiltDeg: number): string {
  const size = formatNumber(Math.abs(tiltDeg), 1);
  if (Number(size) === 0) return 'level with the keel, 0.0°';
  return tiltDeg > 0 ? `nose-up ${size}° (heel-down ${size}°)` : `nose-down ${size}° (heel-up ${size}°)`;
}

/** A share in whole per cent; never 100 % or 0 % where it is not exactly that. */
export function formatShare(share: number): string {
  const percent = Math.round(share * 100);
  if (percent === 100 && share < 1) return 'over 99\u00a0%';
  if (percent === 0 && share > 0) return 'under 1\u00a0%';
  return `${percent}\u00a0%`;
}

/** "2016 – 2022", "since 2019", "until 2010"; null where no year is known. */
export function formatYears(from: number | null | undefined, to: number | null | undefined): string | null {
  if (from != null && to != null) return from === to ? `${from}` : `${from} – ${to}`;
  if (from != null) return `since ${from}`;
  return to != null ? `until ${to}` : null;
}
