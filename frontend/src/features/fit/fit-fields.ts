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
  /** Where it is measured, one sentence. */
  help?: string;
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
    help: 'Angle of the bottom against level, at the transom: lay a level across the keel and measure from it to the bottom.',
  },
  transomAngleDeg: {
    quantity: 'angleDeg',
    min: -5,
    max: 30,
    step: 0.5,
    standard: null,
    label: 'Transom angle',
    help: 'How far the top of the transom leans aft of square to the keel line: hang a plumb line from the top, keel level.',
  },
  transomHeightMm: {
    quantity: 'lengthMm',
    min: 200,
    max: 1200,
    step: 5,
    standard: null,
    label: 'Transom height',
    help: 'From the keel to where the motor clamps, square to the keel line.',
  },
  loadedMassKg: {
    quantity: 'massKg',
    min: 50,
    max: 15000,
    step: 20,
    standard: null,
    label: 'Mass as it is run',
    help: 'Hull, motor, fuel, people and gear together.',
  },
  powerHp: { quantity: 'powerHp', min: 2, max: 600, step: 5, standard: 30, label: 'Power' },
  shaftLengthMm: {
    quantity: 'lengthMm',
    min: 300,
    max: 900,
    step: 5,
    standard: null,
    label: 'Shaft length',
    help: 'From the clamp to the anti-ventilation plate; most are 381, 508, 635 or 762 mm (15, 20, 25 or 30 in).',
  },
  motorOffsetMm: {
    quantity: 'lengthMm',
    min: 150,
    max: 1200,
    step: 10,
    standard: 330,
    label: 'Each motor off centre',
    help: 'Half the distance between the two propeller shafts.',
  },
  motorTrimDeg: {
    quantity: 'angleDeg',
    min: -15,
    max: 75,
    step: 1,
    standard: 0,
    label: 'Motor trim while scanning',
    help: '0° with the propeller shaft parallel to the keel line; out and up is positive.',
  },
  steerDeg: {
    quantity: 'angleDeg',
    min: -40,
    max: 40,
    step: 1,
    standard: 0,
    label: 'Steering',
    help: 'Positive turns the nose of the lower unit to starboard.',
  },
  setbackMm: {
    quantity: 'lengthMm',
    min: 0,
    max: 800,
    step: 10,
    standard: 0,
    label: 'Setback',
    help: 'How far a jack plate or bracket carries the motor aft of the transom.',
  },
  raiseMm: {
    quantity: 'lengthMm',
    min: -150,
    max: 400,
    step: 5,
    standard: 0,
    label: 'Motor raised',
    help: 'How far the motor is lifted along the transom from resting on its top.',
  },
  housingLengthMm: {
    quantity: 'lengthMm',
    min: 60,
    max: 500,
    step: 5,
    standard: 220,
    label: 'Length of the housing',
    help: 'Of the part in the water, along the boat.',
  },
  offsetMm: {
    quantity: 'lengthMm',
    min: -2000,
    max: 2000,
    step: 10,
    standard: 380,
    label: 'Off centre',
    help: 'From the keel line to the middle of the sensor; starboard is positive.',
  },
  dropMm: {
    quantity: 'lengthMm',
    min: -300,
    max: 600,
    step: 1,
    standard: 5,
    label: 'Below the bottom',
    help: 'Lower leading edge below the bottom right ahead of it, at the set tilt.',
  },
  standoffMm: {
    quantity: 'lengthMm',
    min: 0,
    max: 600,
    step: 5,
    standard: null,
    label: 'Standoff',
    help: 'From the transom face, or the board, to the leading edge of the housing; the mount’s own where nothing is given.',
  },
  boardMm: { quantity: 'lengthMm', min: 0, max: 100, step: 1, standard: 0, label: 'Transom board', help: 'Its thickness; 0 for none.' },
  tiltDeg: {
    quantity: 'angleDeg',
    min: -30,
    max: 30,
    step: 0.5,
    standard: null,
    label: 'Tilt against the keel line',
    help: 'Nose-up, which is heel-down, is positive.',
  },
  scanKn: { quantity: 'speedKn', min: 0, max: 60, step: 0.5, standard: 4, label: 'Scanning', help: 'Through the water.' },
  cruiseKn: {
    quantity: 'speedKn',
    min: 0,
    max: 80,
    step: 1,
    standard: null,
    label: 'Cruising',
    help: 'The picture is worked out for this speed too.',
  },
  cruiseMotorTrimDeg: {
    quantity: 'angleDeg',
    min: -15,
    max: 30,
    step: 1,
    standard: null,
    label: 'Motor trim while cruising',
    help: 'The same as while scanning where nothing is given.',
  },
  measuredTrimDeg: {
    quantity: 'angleDeg',
    min: -10,
    max: 20,
    step: 0.5,
    standard: null,
    label: 'Running angle you measured',
    help: 'At the scanning speed, bow up positive, less what the level read on the trailer with the keel level.',
  },
  targetDeg: {
    quantity: 'angleDeg',
    min: -20,
    max: 20,
    step: 0.5,
    standard: 0,
    label: 'Wanted attitude in the water',
    help: '0° holds the sensor level at the scanning speed; nose-up is positive.',
  },
} as const satisfies Record<string, FitField>;

export type FitFieldName = keyof typeof fitFields;
export const fitFieldNames = Object.keys(fitFields) as FitFieldName[];
