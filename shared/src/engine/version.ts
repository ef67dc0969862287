/** Grows whenever a number that the engine answers can change; stands on every answer. */
export const engineVersion = '0.4.3';
