import { monotonicFactory } from 'ulid';

const next = monotonicFactory();

/** Opaque, sortable by the time they were made, stable: `hul_01J…`. */
export const newId = (prefix: string) => `${prefix}_${next()}`;
