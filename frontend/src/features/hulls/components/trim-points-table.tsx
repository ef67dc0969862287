import type { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import { useMemo } from 'react';
import { DataTable, NotNoted, type TableColumn } from '../../../components/ui/table.tsx';
import { formatEstimate, formatQuantity, type Quantity } from '../../../lib/format-units.ts';
import { type UnitChoice, useUnits } from '../../../lib/unit-choice.ts';

/** The measured running angles as rows. */
export function TrimPointsTable({ points }: { points: readonly TrimPoint[] }) {
  const units = useUnits();
  const columns = useMemo(() => columnsFor(units), [units]);
  const bySpeed = useMemo(() => points.toSorted((a, b) => a.speedKn - b.speedKn), [points]);
  return <DataTable caption="Measured running trim, bow up positive" columns={columns} rows={bySpeed} rowId={(point) => point.id} />;
}

function columnsFor(units: UnitChoice): readonly TableColumn<TrimPoint>[] {
  return [
    { id: 'speed', header: 'Speed', narrow: 'head', accessorFn: (point) => formatQuantity(point.speedKn, 'speedKn', units) },
    {
      id: 'trim',
      header: 'Running trim',
      narrow: 'side',
      cell: ({ row: { original } }) => (
        <span className="font-firm">{formatEstimate(original.trimDeg, original.sigmaDeg ?? null, 'angleDeg', units)}</span>
      ),
    },
    { id: 'runs', header: 'Runs', cell: ({ row }) => row.original.runs ?? <NotNoted /> },
    { id: 'load', header: 'Loaded mass', cell: ({ row }) => <Noted value={row.original.loadedMassKg} quantity="massKg" units={units} /> },
    { id: 'motor', header: 'Motor trim', cell: ({ row }) => <Noted value={row.original.motorTrimDeg} quantity="angleDeg" units={units} /> },
    { id: 'condition', header: 'Conditions', narrow: 'note', cell: ({ row }) => row.original.condition ?? <NotNoted /> },
    {
      id: 'source',
      header: 'From where',
      narrow: 'note',
      cell: ({ row: { original } }) => [original.source, original.sourceDate].filter(Boolean).join(', ') || <NotNoted words="not stated" />,
    },
  ];
}

function Noted({ value, quantity, units }: { value: number | undefined; quantity: Quantity; units: UnitChoice }) {
  return value === undefined ? <NotNoted /> : formatQuantity(value, quantity, units);
}
