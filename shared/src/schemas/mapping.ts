// How the columns of a file become the columns of a table.
import * as z from 'zod';
import type { CellUnit } from '../csv/units.ts';

const cellUnits = [
  ...['m', 'cm', 'mm', 'in', 'ft', 'deg', 'arcmin', 'arcsec', 'rad', 'kg', 'lb', 't', 'hp', 'ps', 'kw', 'w'],
  ...['kn', 'km/h', 'mph', 'm/s', 'khz', 'mhz', 'hz', 'db', '%', '1'],
] as [CellUnit, ...CellUnit[]];

const columnName = z.string().min(1).max(80);

/** What stands between the two values of one cell: `5.2 x 2.1`, `2015/2018`, `2015-2018`, … */
export const splitMarks = ['times', 'stroke', 'dash', 'comma', 'semicolon', 'bar', 'space'] as const;
export type SplitMark = (typeof splitMarks)[number];

export const MappedColumn = z
  .strictObject({
    at: z.int().min(0).max(499).describe('Place of the column in the file, counted from 0.'),
    to: columnName.optional().describe('Canonical column; `years` takes model years such as 2015-18. Leave out to leave the column out.'),
    split: z
      .strictObject({ by: z.enum(splitMarks), into: z.tuple([columnName, columnName]) })
      .optional()
      .describe('In place of `to`: one cell that holds two values, such as length × beam.'),
    unit: z.enum(cellUnits).optional().describe('Unit of bare numbers; the column’s own where left out.'),
    erase: z.boolean().default(false).describe('A dash, `none` or `n/a` erases the stored value.'),
  })
  .refine((column) => !(column.to && column.split), { message: 'Either `to` or `split`, not both.', path: ['split'] })
  .meta({ id: 'MappedColumn' });
export type MappedColumn = z.infer<typeof MappedColumn>;

export const Mapping = z
  .strictObject({
    headerRow: z.int().min(1).max(1000).describe('Row that holds the header, counted from 1; what stands above it is left out.'),
    columns: z.array(MappedColumn).max(500),
    constants: z
      .record(columnName, z.string().trim().min(1).max(300))
      .default({})
      .describe('Text of a column that the file lacks: the maker of a maker’s own list, its source.'),
    decimalComma: z.boolean().optional().describe('Whether the comma is the decimal mark; found by itself where left out.'),
  })
  .meta({ id: 'Mapping' });
export type Mapping = z.infer<typeof Mapping>;

const PreviewCell = z
  .strictObject({
    column: columnName,
    text: z.string(),
    value: z.unknown().describe('As it will be stored, in the column’s unit; null for nothing stated.'),
    problem: z.string().nullable().describe('Why the cell cannot be read.'),
  })
  .meta({ id: 'PreviewCell' });

export const MappingSheet = z
  .strictObject({
    top: z.array(z.array(z.string())).describe('First rows of the file as they stand, to choose the header row from.'),
    header: z.array(z.string()),
    mapping: Mapping.describe('Saved, remembered from an earlier file of the same header, or suggested.'),
    origin: z.enum(['saved', 'remembered', 'suggested']),
    missing: z.array(columnName).describe('Required columns that neither a column nor a constant fills.'),
    leftOut: z.array(z.string()).describe('Headers whose cells are not read.'),
    preview: z
      .array(z.strictObject({ n: z.int(), cells: z.array(PreviewCell), problems: z.array(z.string()) }).meta({ id: 'PreviewRow' }))
      .describe('First 20 rows as this mapping reads them.'),
  })
  .meta({ id: 'MappingSheet' });
export type MappingSheet = z.infer<typeof MappingSheet>;

/** The same fix for every cell alike. */
export const Fix = z
  .strictObject({
    column: columnName.describe('Canonical column.'),
    from: z.string().max(2000).describe('The cell’s text, blanks around it aside.'),
    to: z.string().max(2000).describe('Text in its place.'),
  })
  .meta({ id: 'Fix' });
export type Fix = z.infer<typeof Fix>;

export const FixResult = z.strictObject({ rows: z.int().describe('Rows that were judged again.') }).meta({ id: 'FixResult' });
