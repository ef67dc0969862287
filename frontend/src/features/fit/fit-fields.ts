// Every number of the check that a person can set: its name in the address, its range, its step, its words.
// Ranges are what boats have; the API's own are wider (common practice, no source).
import type { Quantity } from '../../lib/format-units.ts';

export interface FitField {
  /** Stored and written in the address in this quantity's unit, whatever unit is shown. */
  quantity: Quantity;
  min: number;
  max: number;
  /** What one press of plus or minus does. */
  step: number;
  /** Stands where the address says nothing; null means "don't know" or "as needed". */
  standard: number | null;
  label: string;
  /** What it is, one line under the label. */
  help?: string;
  /** Where an owner measures it, folded away until asked for. */
  where?: string;
}

export const fitFields = {
  lengthM: {
    quantity: 'lengthM',
    min: 1.5,
    max: 20,
    step: 0.1,
    standard: 4.5,
    label: 'Length of the hull',
    help: 'Without swim platform or motor.',
  },
  deadriseDeg: {
    quantity: 'angleDeg',
    min: 0,
    max: 30,
    step: 1,
    standard: null,
    label: 'Deadrise',
    where: 'Angle of the bottom against level, at the transom: lay a level across the keel and measure from it to the bottom.',
  },
  transomAngleDeg: {
    quantity: 'angleDeg',
    min: -5,
    max: 30,
    step: 0.5,
    standard: null,
    label: 'Transom angle',
    where: 'How far the top of the transom leans aft of square to the keel line: hang a plumb line from the top, keel level.',
  },
  transomHeightMm: {
    quantity: 'lengthMm',
    min: 200,
    max: 1200,
    step: 5,
    standard: null,
    label: 'Transom height',
    where: 'From the keel to where the motor clamps, square to the keel line.',
  },
  loadedMassKg: {
    quantity: 'massKg',
    min: 50,
    max: 15000,
    step: 20,
    standard: null,
    label: 'Mass as it is run',
    help: 'With motor, fuel, people and gear.',
  },
  powerHp: { quantity: 'powerHp', min: 2, max: 600, step: 5, standard: 30, label: 'Power' },
  shaftLengthMm: {
    quantity: 'lengthMm',
    min: 300,
    max: 900,
    step: 5,
    standard: null,
    label: 'Shaft length',
    where: 'From the clamp to the anti-ventilation plate; most are 381, 508, 635 or 762 mm (15, 20, 25 or 30 in).',
  },
  motorOffsetMm: {
    quantity: 'lengthMm',
    min: 150,
    max: 1200,
    step: 10,
    standard: 330,
    label: 'Each motor off centre',
    where: 'Half the distance between the two propeller shafts.',
  },
  motorTrimDeg: {
    quantity: 'angleDeg',
    min: -15,
    max: 75,
    step: 1,
    standard: 0,
    label: 'Motor trim while scanning',
    help: '0° with the shaft parallel to the keel; up is positive.',
  },
  steerDeg: {
    quantity: 'angleDeg',
    min: -40,
    max: 40,
    step: 1,
    standard: 0,
    label: 'Steering',
    help: 'Nose of the lower unit to starboard is positive.',
  },
  setbackMm: {
    quantity: 'lengthMm',
    min: 0,
    max: 800,
    step: 10,
    standard: 0,
    label: 'Setback',
    help: 'By a jack plate or bracket, aft.',
  },
  raiseMm: {
    quantity: 'lengthMm',
    min: -150,
    max: 400,
    step: 5,
    standard: 0,
    label: 'Motor raised',
    help: 'Along the transom, from resting on its top.',
  },
  housingLengthMm: {
    quantity: 'lengthMm',
    min: 60,
    max: 500,
    step: 5,
    standard: 220,
    label: 'Length of the housing',
    where: 'Of the part in the water, along the boat.',
  },
  offsetMm: {
    quantity: 'lengthMm',
    min: -2000,
    max: 2000,
    step: 10,
    standard: 380,
    label: 'Off centre, to starboard',
    help: 'To the middle of the sensor; to port is negative.',
  },
  dropMm: {
    quantity: 'lengthMm',
    min: -300,
    max: 600,
    step: 1,
    standard: 5,
    label: 'Below the bottom',
    where: 'Lower leading edge below the bottom right ahead of it, at the set tilt.',
  },
  standoffMm: {
    quantity: 'lengthMm',
    min: 0,
    max: 600,
    step: 5,
    standard: null,
    label: 'Standoff',
    where: 'From the transom face, or the board, to the leading edge of the housing; the mount’s own where nothing is given.',
  },
  localBottomMm: {
    quantity: 'lengthMm',
    min: -800,
    max: 800,
    step: 5,
    standard: null,
    label: 'Bottom at the sensor, below the keel line',
    help: 'Only for pontoons, catamarans and stepped bottoms; above the keel line is negative.',
    where: 'With the boat level on its trailer, from the height of the keel at the transom down to the bottom where the sensor goes.',
  },
  boardMm: { quantity: 'lengthMm', min: 0, max: 100, step: 1, standard: 0, label: 'Transom board', help: 'Its thickness; 0 for none.' },
  tiltDeg: {
    quantity: 'angleDeg',
    min: -30,
    max: 30,
    step: 0.5,
    standard: null,
    label: 'Tilt against the keel line',
    help: 'Nose-up (heel-down) is positive.',
  },
  scanKn: { quantity: 'speedKn', min: 0, max: 60, step: 0.5, standard: 4, label: 'Scanning speed' },
  cruiseKn: {
    quantity: 'speedKn',
    min: 0,
    max: 80,
    step: 1,
    standard: null,
    label: 'Cruising speed',
  },
  cruiseMotorTrimDeg: {
    quantity: 'angleDeg',
    min: -15,
    max: 30,
    step: 1,
    standard: null,
    label: 'Motor trim while cruising',
  },
  measuredTrimDeg: {
    quantity: 'angleDeg',
    min: -10,
    max: 20,
    step: 0.5,
    standard: null,
    label: 'Running angle you measured',
    where: 'At the scanning speed, bow up positive, less what the level read on the trailer with the keel level.',
  },
  targetDeg: {
    quantity: 'angleDeg',
    min: -20,
    max: 20,
    step: 0.5,
    standard: 0,
    label: 'Wanted attitude in the water',
    help: '0° is level at the scanning speed; nose-up is positive.',
  },
} as const satisfies Record<string, FitField>;

export type FitFieldName = keyof typeof fitFields;
export const fitFieldNames = Object.keys(fitFields) as FitFieldName[];
