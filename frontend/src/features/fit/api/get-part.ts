import { queryOptions, skipToken, useQuery } from '@tanstack/react-query';
import { api, bodyOf } from '../../../lib/api-client.ts';

/** A hull with its measured running angles, as a question takes them. */
async function hullWithTrimPoints(id: string, signal: AbortSignal) {
  const params = { path: { id } };
  const [sheet, points] = await Promise.all([
    bodyOf(api.GET('/hulls/{id}', { params, signal })),
    bodyOf(api.GET('/hulls/{id}/trim-points', { params, signal })),
  ]);
  const trimPoints = points.data.map(({ speedKn, trimDeg, sigmaDeg, runs, loadedMassKg, motorTrimDeg }) => ({
    speedKn,
    trimDeg,
    sigmaDeg,
    runs,
    loadedMassKg,
    motorTrimDeg,
  }));
  return { ...sheet, trimPoints };
}

const parts = {
  hull: hullWithTrimPoints,
  motor: (id: string, signal: AbortSignal) => bodyOf(api.GET('/lower-units/{id}', { params: { path: { id } }, signal })),
  sensor: (id: string, signal: AbortSignal) => bodyOf(api.GET('/transducers/{id}', { params: { path: { id } }, signal })),
  mount: (id: string, signal: AbortSignal) => bodyOf(api.GET('/mounts/{id}', { params: { path: { id } }, signal })),
};
type Parts = typeof parts;
export type PartSheet<K extends keyof Parts> = Awaited<ReturnType<Parts[K]>>;

const partQuery = <K extends keyof Parts>(kind: K, id: string | null) =>
  queryOptions({
    queryKey: ['part', kind, id],
    queryFn: id === null ? skipToken : ({ signal }) => parts[kind](id, signal) as Promise<PartSheet<K>>,
    staleTime: 5 * 60_000,
  });

/** The sheet of a chosen part; nothing is asked for where none is chosen. */
export function usePart<K extends keyof Parts>(kind: K, id: string | null) {
  return useQuery(partQuery(kind, id));
}
