export interface Between {
  from: number;
  to: number;
}

/** Two editions out of an address or a form; words on what is wrong where they make no sense, null where nothing is asked. */
export function readBetween(from: string | null, to: string | null): Between | string | null {
  if ((from ?? '') === '' && (to ?? '') === '') return null;
  const [earlier, later] = [readEdition(from), readEdition(to)];
  if (earlier === undefined || later === undefined) return 'Give two whole numbers: the edition to start from and the one to end at.';
  if (earlier === later) return 'These are one and the same edition.';
  // Whichever way round they were given, the later one is looked at from the earlier.
  return { from: Math.min(earlier, later), to: Math.max(earlier, later) };
}

function readEdition(text: string | null): number | undefined {
  return text !== null && /^\d{1,9}$/.test(text.trim()) ? Number(text) : undefined;
}
