// Reading the catalog: the same five addresses for each of the four kinds.
import { answerFields, TrimAnswer } from '@tiltwright/shared/schemas/answer.ts';
import { type CatalogTable, catalogTables } from '@tiltwright/shared/schemas/catalog-record.ts';
import { Revision } from '@tiltwright/shared/schemas/edition.ts';
import { runningFields } from '@tiltwright/shared/schemas/fit.ts';
import { hullForms } from '@tiltwright/shared/schemas/hull.ts';
import { TrimPoint } from '@tiltwright/shared/schemas/trim-point.ts';
import * as z from 'zod';
import type { Deps } from '../../deps.ts';
import { ApiProblem } from '../../errors.ts';
import { listOf, pageFields } from '../../http/cursor.ts';
import { answeredFromCache } from '../../http/etag.ts';
import { type Route, revalidate, route } from '../../http/operation.ts';
import { answerHullTrim } from '../questions/answer-hull-trim.ts';
import { type CatalogRow, kinds, toSheet } from './kinds.ts';
import { listCatalog } from './list-catalog.ts';
import { findRecord, listRevisions, listTrimPoints } from './queries.ts';

const idParams = z.strictObject({ id: z.string().min(1).max(80) });

const commonFilter = {
  q: z.string().trim().min(1).max(120).optional().describe('Part of maker, model, package or another spelling; slips allowed.'),
  maker: z.string().trim().min(1).max(80).optional(),
  year: z.int().min(1900).max(2100).optional().describe('Built in that model year.'),
  generic: z.boolean().optional().describe('Only the generic parts, or none of them.'),
  ...pageFields,
};
const hullFilter = {
  ...commonFilter,
  form: z.enum(hullForms).optional(),
  lengthMinM: z.number().min(0).max(100).optional(),
  lengthMaxM: z.number().min(0).max(100).optional(),
  deadriseMinDeg: z.number().min(0).max(90).optional(),
  deadriseMaxDeg: z.number().min(0).max(90).optional(),
};

export function catalogRoutes(deps: Deps): Route[] {
  return [...catalogTables.flatMap((kind) => kindRoutes(deps, kind)), ...hullRoutes(deps)];
}

/** @throws ApiProblem not-found */
export function recordOrProblem(deps: Deps, kind: CatalogTable, id: string): CatalogRow {
  const row = findRecord(deps.db, kind, id);
  if (!row) throw new ApiProblem('not-found', `There is no ${kinds[kind].noun} with the id ${id}.`);
  return row;
}

function kindRoutes(deps: Deps, kind: CatalogTable): Route[] {
  const { noun, title, record, sheet } = kinds[kind];
  const tag = 'Catalog';
  const may = 'catalog.read';
  return [
    route(
      {
        id: `list${title}s`,
        method: 'get',
        path: `/${kind}`,
        tag,
        summary: `List or find ${noun}s`,
        description: `In order of maker and model; with \`q\` the best match first. Withdrawn and superseded records are not listed.`,
        may,
        query: z.strictObject(kind === 'hulls' ? hullFilter : commonFilter),
        reply: { status: 200, description: `A page of ${noun}s.`, schema: listOf(record) },
        problems: ['stale-edition'],
        byEdition: true,
        cache: revalidate,
      },
      ({ query }) => listCatalog(deps, kind, query),
    ),
    route(
      {
        id: `get${title}`,
        method: 'get',
        path: `/${kind}/{id}`,
        tag,
        summary: `One ${noun}, each value with where it comes from`,
        description: 'A superseded id still answers, with `supersededBy`. The ETag is the record’s own revision.',
        may,
        params: idParams,
        reply: { status: 200, description: `The ${noun}’s sheet.`, schema: sheet },
        problems: ['not-found'],
        byEdition: true,
        cache: revalidate,
      },
      ({ params, req, res }) => {
        const row = recordOrProblem(deps, kind, params.id);
        return answeredFromCache(req, res, `${row.id}.${row.revision}`) ? undefined : toSheet(kind, row);
      },
    ),
    route(
      {
        id: `list${title}Revisions`,
        method: 'get',
        path: `/${kind}/{id}/revisions`,
        tag,
        summary: `What changed in one ${noun}, newest first`,
        may,
        params: idParams,
        reply: { status: 200, description: 'Its history.', schema: listOf(Revision) },
        problems: ['not-found'],
        byEdition: true,
        cache: revalidate,
      },
      ({ params }) => {
        const { id } = recordOrProblem(deps, kind, params.id);
        const data = listRevisions(deps.db, id).map(({ revision, edition, at, actor, why, source, changes }) => ({
          revision,
          edition,
          at,
          actor,
          why,
          source,
          changes,
        }));
        return { data, next: null };
      },
    ),
  ];
}

function hullRoutes(deps: Deps): Route[] {
  return [
    route(
      {
        id: 'listTrimPoints',
        method: 'get',
        path: '/hulls/{id}/trim-points',
        tag: 'Catalog',
        summary: 'Measured running angles of one hull, slowest first',
        may: 'catalog.read',
        params: idParams,
        reply: { status: 200, description: 'Its points.', schema: listOf(TrimPoint) },
        problems: ['not-found'],
        byEdition: true,
        cache: revalidate,
      },
      ({ params }) => {
        const { id } = recordOrProblem(deps, 'hulls', params.id);
        return { data: listTrimPoints(deps.db, id).map(toTrimPoint), next: null };
      },
    ),
    route(
      {
        id: 'getHullTrim',
        method: 'get',
        path: '/hulls/{id}/trim',
        tag: 'Catalog',
        summary: 'Running trim of one hull at a speed',
        may: 'fit.compute',
        params: idParams,
        query: z.strictObject({ speedKn: runningFields.speedKn, loadedMassKg: runningFields.loadedMassKg }),
        reply: {
          status: 200,
          description: 'The trim with its basis and spread.',
          schema: z.strictObject({ trim: TrimAnswer, ...answerFields }).meta({ id: 'HullTrim' }),
        },
        problems: ['not-found'],
        byEdition: true,
        cache: revalidate,
      },
      ({ params, query }) => answerHullTrim(deps.parts, recordOrProblem(deps, 'hulls', params.id).id, query),
    ),
  ];
}

function toTrimPoint({
  hullId,
  matchKey: _matchKey,
  status: _status,
  revision: _revision,
  ...point
}: ReturnType<typeof listTrimPoints>[number]): TrimPoint {
  const stated = Object.entries(point).filter(([name, value]) => value !== null || name === 'source' || name === 'sourceDate');
  return { ...Object.fromEntries(stated), hull: hullId } as TrimPoint;
}
