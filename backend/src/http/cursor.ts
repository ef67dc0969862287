import * as z from 'zod';
import { ApiProblem } from '../errors.ts';

/** Parameters every list takes. */
export const pageFields = {
  limit: z.int().min(1).max(200).default(50).describe('Rows a page, at most 200.'),
  cursor: z.string().max(500).optional().describe('`next` of the page before.'),
};

export interface Place {
  /** Edition the list was begun at: later pages show the same one or are refused. */
  edition: number;
  /** Rows already given. */
  after: number;
}

export const encodeCursor = (place: Place) => Buffer.from(JSON.stringify([place.edition, place.after])).toString('base64url');

/** @throws ApiProblem invalid-input for a cursor that is none of ours, stale-edition when the catalog has moved on */
export function decodeCursor(cursor: string | undefined, edition: number): Place {
  if (cursor === undefined) return { edition, after: 0 };
  const place = z.tuple([z.int().nonnegative(), z.int().nonnegative()]).safeParse(fromBase64(cursor));
  if (!place.success)
    throw new ApiProblem('invalid-input', 'cursor: use `next` as it was given.', [
      { path: 'cursor', code: 'invalid-cursor', message: 'Use `next` as it was given.' },
    ]);
  if (place.data[0] !== edition)
    throw new ApiProblem(
      'stale-edition',
      `The catalog is at edition ${edition} now; this list was begun at ${place.data[0]}. Begin again.`,
    );
  return { edition, after: place.data[1] };
}

function fromBase64(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    return undefined;
  }
}

/** One page from rows of which one more than `limit` was read. */
export function page<T>(rows: T[], limit: number, place: Place): { data: T[]; next: string | null } {
  const more = rows.length > limit;
  return {
    data: more ? rows.slice(0, limit) : rows,
    next: more ? encodeCursor({ edition: place.edition, after: place.after + limit }) : null,
  };
}

export const listOf = <S extends z.ZodType>(row: S) =>
  z.strictObject({ data: z.array(row), next: z.string().nullable().describe('Cursor of the next page; null on the last.') });

/** A page of a list in order of ids, which no edition moves: the cursor is the last id given. */
export function pageById<T extends { id: string }>(rows: T[], limit: number): { data: T[]; next: string | null } {
  const data = rows.slice(0, limit);
  return { data, next: rows.length > limit ? Buffer.from(data.at(-1)!.id).toString('base64url') : null };
}

/** @throws ApiProblem invalid-input for a cursor that is none of ours */
export function decodeIdCursor(cursor: string | undefined): string | undefined {
  if (cursor === undefined) return undefined;
  const id = Buffer.from(cursor, 'base64url').toString('utf8');
  if (!/^\w{3,80}$/.test(id))
    throw new ApiProblem('invalid-input', 'cursor: use `next` as it was given.', [
      { path: 'cursor', code: 'invalid-cursor', message: 'Use `next` as it was given.' },
    ]);
  return id;
}
