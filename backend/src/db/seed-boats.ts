// The demo owner's boats: each row of the table is a rig, kept as the question it asks.

import type { CatalogTable } from '@tiltwright/shared/schemas/catalog-record.ts';
import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { parse } from 'csv-parse/sync';
import { newId } from '../ids.ts';
import { findUserByEmail } from '../resources/accounts/queries.ts';
import { storedRecords, type Years } from '../resources/imports/stored.ts';
import { StartProblem } from '../start-problem.ts';
import type { Db } from './connect.ts';
import { boats } from './schema/people.ts';

type Row = Record<string, string>;
const anyYear: Years = { from: null, to: null };
const number = (text: string | undefined) => (text === undefined || text === '' ? undefined : Number(text));

export function seedBoats(db: Db, csv: string): void {
  const rows = parse(csv, { columns: true }) as Row[];
  const find = (kind: CatalogTable, maker: string, model: string, years: Years, pack = '') => {
    const found = storedRecords(db, kind).matching(maker, model, pack, years)[0];
    if (!found) throw new StartProblem(`The demo boats name ${maker} ${model}, which is not in the catalog.`);
    return found.id;
  };
  for (const row of rows) {
    const owner = findUserByEmail(db, row.owner_email ?? '');
    if (!owner) throw new StartProblem(`The demo boat ${row.name} belongs to nobody.`);
    const year = number(row.hull_year) ?? null;
    const hull = find('hulls', row.hull_maker ?? '', row.hull_model ?? '', { from: year, to: year }, row.hull_package);
    const lowerUnit = find('lower-units', row.lower_unit_maker ?? '', row.lower_unit_model ?? '', anyYear);
    const question = FitQuestion.parse({
      hull,
      lowerUnits: (row.engine_offsets_mm ?? '0').split('|').map((offset) => ({
        lowerUnit,
        offsetMm: Number(offset),
        setbackMm: number(row.setback_mm),
        raiseMm: number(row.raise_mm),
        motorTrimDeg: number(row.motor_trim_deg),
      })),
      transducer: find('transducers', row.transducer_maker ?? '', row.transducer_model ?? '', anyYear),
      mount: find('mounts', row.mount_maker ?? '', row.mount_model ?? '', anyYear),
      placement: {
        offsetMm: number(row.offset_mm),
        dropMm: number(row.drop_mm),
        standoffMm: number(row.standoff_mm),
        boardMm: number(row.board_mm),
        tiltDeg: number(row.tilt_deg),
      },
      running: { speedKn: number(row.speed_kn), water: row.water },
      alsoAt: [{ label: 'cruising', speedKn: number(row.cruise_kn), motorTrimDeg: number(row.cruise_motor_trim_deg) }],
      target: { attitudeDeg: number(row.target_deg) ?? 0 },
    });
    db.insert(boats)
      .values({
        id: newId('boa'),
        userId: owner.id,
        name: row.name ?? '',
        story: row.story ?? null,
        hullId: hull,
        question,
        createdAt: new Date().toISOString(),
      })
      .run();
  }
}
