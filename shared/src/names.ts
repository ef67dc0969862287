// How names are compared: without case, accents, spaces and marks.

const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** `Rush-Cutter 14` → `rushcutter14`; empty for a name of marks alone. */
export const normaliseName = (text: string) => plain(text).replace(/[^\p{L}\p{N}]/gu, '');

/** `Rush-Cutter 14XL` → `rush`, `cutter`, `14`, `xl`: runs of letters and runs of digits. */
export const nameWords = (text: string): string[] => plain(text).match(/\p{L}+|\p{N}+/gu) ?? [];

/** What a CSV row is matched by, beside its years. */
export const matchKey = (maker: string, model: string, pack?: string | null) => [maker, model, pack ?? ''].map(normaliseName).join('|');
