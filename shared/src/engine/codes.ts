// Every coded word an answer can carry, with the sentence that explains it. The lists are closed.

export const reasonCodes = {
  'all-clear': 'The beam clears on every wanted side, and the needed tilt is within reach.',
  'side-shaded': 'A wanted side loses part of its picture as the motor and the sensor are set.',
  'side-blocked': 'A wanted side is largely hidden as the motor and the sensor are set.',
  'blocked-at-every-setting': 'A wanted side stays largely hidden at every motor trim under power and every tilt within reach.',
  'tilt-out-of-range': 'The needed tilt lies outside the range of the bracket; a wedge closes the gap.',
  'measuring-under-way':
    'Under way a competent person keeps the helm and looks out; the one who measures sits low, wears a lifejacket and never leans over the transom.',
  'fuse-near-battery': 'Fuse the power cable near the battery; ask a qualified technician when unsure.',
  'near-a-part': 'The beam passes so near a part that its edge is disturbed.',
  'blocked-or-clear': 'With what is known a wanted side may as well be blocked as clear.',
  'maybe-not-clear': 'A wanted side is clear by the middle figures, but less than nine times in ten.',
  'rule-says-no': 'A rule of compatibility says no.',
  'rule-calls-for-care': 'A rule of compatibility or of the water flow calls for care.',
  'local-bottom-unknown': 'The bottom at the sensor is no plain vee, and its height there was not stated.',
  'sensor-inside-part': 'The sensor as placed stands inside another part.',
  'motor-inside-hull': 'The motor as set stands inside the hull.',
  'no-side-element': 'The transducer has no side element, so there is no side beam to clear.',
} as const;
export type ReasonCode = keyof typeof reasonCodes;

export const cautionCodes = {
  'estimate-only':
    'This is an estimate, not an approval, and not for navigation. Follow the boat, motor and transducer makers’ instructions.',
  'holes-can-sink':
    'A hole below the waterline can sink a boat: drill as few as possible, check inside first, bed and seal them, and stop if the core is wet.',
  'engine-off': 'Engine off, key out and kill cord off before working near the propeller; support a tilted motor.',
  'measuring-under-way':
    'Under way a competent person keeps the helm and looks out; the one who measures sits low, wears a lifejacket and never leans over the transom.',
  'fuse-near-battery': 'Fuse the power cable near the battery; ask a qualified technician when unsure.',
  'near-a-part': 'The beam passes nearer to a part than the diffraction margin, so its edge may be disturbed.',
  'trim-is-class-value': 'The running trim is a class value; measure it under way before drilling.',
} as const;
export type CautionCode = keyof typeof cautionCodes;

export const actionTexts = {
  leave: 'Leave it as it is.',
  're-tilt': 'Set the tilt anew: to the needed one, or to the nearest one at which both sides are clear.',
  'trim-motor-up': 'Trim the motor up until the beam passes ahead of it.',
  move: 'Move the sensor: farther from the motor, or to the other side.',
  'add-wedge': 'Put a wedge behind the bracket.',
  'measure-first': 'Measure first: the answer hangs on something nobody has stated.',
  'choose-another-mount': 'Choose another mount.',
} as const;

export const trimFlagTexts = {
  'speed-outside-range': 'The speed lies outside the range of the planing formulas (Cv 0.60 to 13).',
  'trim-outside-range': 'The computed trim lies outside the range of the planing formulas (2° to 15°).',
  'wetted-length-outside-range': 'The wetted length lies outside the range of the planing formulas (4 beams).',
  'dry-chine': 'The chine runs dry: the boat rides on the vee alone.',
  'no-planing-solution': 'The planing formulas give no balance for these figures; a class value stands in.',
  'motor-trim-unknown': 'The motor trim under way is not known.',
  'measurement-disagrees': 'A measurement differs more from the estimate than it should; it is used only where it was made.',
  'outside-measured-range': 'The speed lies outside the measured range; the measurement fades with distance.',
} as const;

export function coded<Code extends string>(texts: Record<Code, string>, code: Code): { code: Code; text: string } {
  return { code, text: texts[code] };
}
