// The columns of demo-boats.csv: whose boat it is, what hangs on its transom and how it is run.
import type { Column } from '../shared/src/csv/columns.ts';
import { engineFields, placementFields, runningFields, waters } from '../shared/src/schemas/fit.ts';

type DemoBoatColumn = Omit<Column, 'role' | 'field'>;

function name(column: string, label: string, help?: string, required = true): DemoBoatColumn {
  return { column, required, kind: 'text', label, maxLength: 80, ...(help && { help }) };
}

interface Bounds {
  minValue: number | null;
  maxValue: number | null;
}

/** A number whose range is the one that a fit question allows. */
function bounded(column: string, unit: Column['unit'], { minValue, maxValue }: Bounds, label: string, help?: string): DemoBoatColumn {
  return {
    column,
    required: true,
    kind: 'number',
    unit,
    min: minValue ?? undefined,
    max: maxValue ?? undefined,
    label,
    ...(help && { help }),
  };
}

const { setbackMm, raiseMm, motorTrimDeg } = engineFields;
const { offsetMm, dropMm, standoffMm, boardMm, tiltDeg } = placementFields;
const { speedKn } = runningFields;

export const demoBoatColumns: readonly DemoBoatColumn[] = [
  name('owner_email', 'Account the boat belongs to'),
  name('name', 'Name of the boat'),
  { ...name('story', 'Story', 'What its owner wants to know.'), maxLength: 1000 },
  name('hull_maker', 'Hull maker'),
  name('hull_model', 'Hull model'),
  name('hull_package', 'Hull package', undefined, false),
  { column: 'hull_year', required: true, kind: 'integer', unit: 'year', min: 1900, max: 2100, label: 'Hull year' },
  name('lower_unit_maker', 'Lower unit maker'),
  name('lower_unit_model', 'Lower unit model', 'The same for every engine.'),
  {
    column: 'engine_offsets_mm',
    required: true,
    kind: 'list',
    items: 'text',
    unit: 'mm',
    maxLength: 8,
    label: 'Engines off the centreline',
    help: 'One item an engine, starboard positive.',
  },
  bounded('setback_mm', 'mm', setbackMm.unwrap(), 'Setback', 'How far a jack plate or bracket sets the engine aft.'),
  bounded('raise_mm', 'mm', raiseMm.unwrap(), 'Raise', 'How far the engine is raised along the transom.'),
  bounded('motor_trim_deg', 'deg', motorTrimDeg.unwrap(), 'Motor trim while scanning', '0 with the prop shaft parallel to the keel line.'),
  name('transducer_maker', 'Transducer maker'),
  name('transducer_model', 'Transducer model'),
  name('mount_maker', 'Mount maker'),
  name('mount_model', 'Mount model'),
  bounded('offset_mm', 'mm', offsetMm, 'Sensor off the centreline', 'Starboard positive.'),
  bounded('drop_mm', 'mm', dropMm, 'Drop', 'Lower leading edge below the local bottom.'),
  bounded('standoff_mm', 'mm', standoffMm.unwrap(), 'Standoff', 'Transom face or board to the leading edge.'),
  bounded('board_mm', 'mm', boardMm.unwrap(), 'Thickness of a transom board', '0 for none.'),
  bounded('tilt_deg', 'deg', tiltDeg.unwrap(), 'Set tilt against the keel line', 'Nose-up (heel-down) positive.'),
  bounded('speed_kn', 'kn', speedKn, 'Speed while scanning', 'Through the water.'),
  bounded('cruise_kn', 'kn', speedKn, 'Cruising speed', 'Through the water.'),
  bounded(
    'cruise_motor_trim_deg',
    'deg',
    motorTrimDeg.unwrap(),
    'Motor trim while cruising',
    '0 with the prop shaft parallel to the keel line.',
  ),
  { column: 'water', required: true, kind: 'enum', values: waters, label: 'Water' },
  {
    column: 'target_deg',
    required: true,
    kind: 'number',
    unit: 'deg',
    min: -45,
    max: 45,
    label: 'Wanted attitude in the water',
    help: 'Nose-up positive.',
  },
];
