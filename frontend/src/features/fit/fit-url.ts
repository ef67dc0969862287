// The check in the address: readable, stable names, one value each. What cannot be read is refused in words and the rest is kept.
import { formatQuantity } from '../../lib/format-units.ts';
import { metricUnits } from '../../lib/unit-choice.ts';
import { type FitFieldName, fitFieldNames, fitFields } from './fit-fields.ts';
import { type FitChoiceName, type FitPartName, type FitState, fitChoices, fitParts, standardState } from './fit-state.ts';

/** One thing in the address that could not be used. */
export interface Refusal {
  name: string;
  message: string;
}

/** What a link was made with, so that a later visit can say what has changed. */
export interface LinkStamp {
  edition: number | null;
  engineVersion: string | null;
}

export interface FitAddress {
  state: FitState;
  refused: Refusal[];
  stamp: LinkStamp;
}

const choiceNames = Object.keys(fitChoices) as FitChoiceName[];
const stampNames = ['edition', 'engine'] as const;
const knownNames: ReadonlySet<string> = new Set([...fitFieldNames, ...choiceNames, ...fitParts, ...stampNames]);

/** Reads the address; never throws. */
export function readFitAddress(search: URLSearchParams): FitAddress {
  const refused: Refusal[] = [];
  const refuse = (name: string, message: string) => refused.push({ name, message });
  const state: Record<string, unknown> = { ...standardState };

  for (const name of new Set(search.keys())) {
    const raw = search.get(name) ?? '';
    if (!knownNames.has(name)) refuse(name, `“${shown(name)}” means nothing here and was left out.`);
    else if (search.getAll(name).length > 1)
      refuse(name, `“${name}” stands there more than once; the first one, “${shown(raw)}”, is used.`);
  }
  for (const name of fitFieldNames) {
    const raw = search.get(name);
    if (raw !== null) readNumber(name, raw, state, refuse);
  }
  for (const name of choiceNames) {
    const raw = search.get(name);
    if (raw === null) continue;
    const { choices, standard } = fitChoices[name];
    const choice = (choices as readonly string[]).find((word) => word === raw);
    if (choice) state[name] = choice;
    else refuse(name, `“${name}” can be ${choices.join(', ')}, not “${shown(raw)}”; ${standard} is used.`);
  }
  for (const name of fitParts) {
    const raw = search.get(name);
    if (raw === null) continue;
    if (isPartId(raw)) state[name] = raw;
    else refuse(name, `“${shown(raw)}” is not the id of a ${partWord(name)} and was left out.`);
  }
  return { state: state as unknown as FitState, refused, stamp: readStamp(search) };
}

function readNumber(name: FitFieldName, raw: string, state: Record<string, unknown>, refuse: (name: string, message: string) => void) {
  const { label, min, max, standard, quantity } = fitFields[name];
  const instead = standard === null ? 'it was left out' : `${formatQuantity(standard, quantity, metricUnits)} is used`;
  // "5," and "0x10" and "" are numbers to Number() or nearly so; a plain decimal is all that the page ever writes.
  if (!/^-?\d{1,7}(\.\d{1,6})?$/.test(raw)) {
    refuse(name, `${label}: “${shown(raw)}” is not a number; ${instead}.`);
    return;
  }
  const value = Number(raw);
  if (value < min || value > max) {
    const range = `${formatQuantity(min, quantity, metricUnits)} to ${formatQuantity(max, quantity, metricUnits)}`;
    refuse(name, `${label}: ${formatQuantity(value, quantity, metricUnits)} is outside ${range}; ${instead}.`);
    return;
  }
  state[name] = value;
}

function readStamp(search: URLSearchParams): LinkStamp {
  const edition = search.get('edition');
  const engineVersion = search.get('engine');
  return {
    edition: edition !== null && /^\d{1,9}$/.test(edition) ? Number(edition) : null,
    engineVersion: engineVersion !== null && /^[\w.+-]{1,40}$/.test(engineVersion) ? engineVersion : null,
  };
}

/** Writes what differs from the standard check, in a fixed order, so that equal checks have equal addresses. */
export function writeFitAddress(state: FitState, stamp?: LinkStamp): URLSearchParams {
  const search = new URLSearchParams();
  for (const name of [...fitParts, ...choiceNames, ...fitFieldNames]) {
    const value = state[name];
    if (value !== null && value !== standardState[name]) search.set(name, typeof value === 'number' ? plainNumber(value) : value);
  }
  if (stamp?.edition != null) search.set('edition', String(stamp.edition));
  if (stamp?.engineVersion != null) search.set('engine', stamp.engineVersion);
  return search;
}

/** No exponent and no digits below a millionth: what readNumber takes. */
function plainNumber(value: number): string {
  return String(Number(value.toFixed(6)));
}

function isPartId(raw: string): boolean {
  return /^[\w-]{1,80}$/.test(raw);
}

const partWords: Record<FitPartName, string> = { hull: 'boat', motor: 'lower unit', sensor: 'transducer', mount: 'mount' };
export function partWord(name: FitPartName): string {
  return partWords[name];
}

function shown(raw: string): string {
  return raw.length > 40 ? `${raw.slice(0, 40)}…` : raw;
}
