import type { Fate, FateCounts, ImportStatus } from '@tiltwright/shared/schemas/import.ts';

export const statusWords: Record<ImportStatus, string> = {
  uploaded: 'uploaded, not yet checked',
  mapped: 'uploaded, not yet checked',
  checking: 'being checked',
  checked: 'checked, waits for your decision',
  publishing: 'being published',
  published: 'published',
  discarded: 'discarded',
  failed: 'could not be read',
};

export const fateWords: Record<Fate, string> = {
  new: 'new',
  changed: 'changed',
  unchanged: 'unchanged',
  duplicate: 'twice in the file',
  conflict: 'held back',
  error: 'wrong',
};
export const allFates = Object.keys(fateWords) as Fate[];

/** What becomes of a row of this fate when the table is published. */
export const fateMeaning: Record<Fate, string> = {
  new: 'Will be added.',
  changed: 'Will change the record as shown.',
  unchanged: 'Says what the catalog says already.',
  duplicate: 'The same row stands in the file before; this one is left out.',
  conflict: 'Would replace a better-known value; it is left out.',
  error: 'Is left out until the cell is mended.',
};

export function countOf(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** "2 new and 1 changed record"; null where there is nothing to publish. */
export function publishableWords(counts: FateCounts): string | null {
  if (counts.new + counts.changed === 0) return null;
  const parts = [counts.new > 0 ? `${counts.new} new` : '', counts.changed > 0 ? `${counts.changed} changed` : ''].filter(Boolean);
  const last = counts.changed > 0 ? counts.changed : counts.new;
  return `${parts.join(' and ')} ${last === 1 ? 'record' : 'records'}`;
}

/** "3 rows are left out: 1 wrong, 2 twice in the file"; null where every row counts. */
export function leftOutWords(counts: FateCounts): string | null {
  const fates = (['error', 'conflict', 'duplicate'] as const).filter((fate) => counts[fate] > 0);
  const sum = fates.reduce((total, fate) => total + counts[fate], 0);
  if (sum === 0) return null;
  return `${sum === 1 ? '1 row is' : `${sum} rows are`} left out: ${fates.map((fate) => `${counts[fate]} ${fateWords[fate]}`).join(', ')}`;
}
