/** What a hull is made of; mounts name the materials they may be fixed to. */
export const hullMaterials = ['aluminium', 'glass-fibre', 'wood', 'polyethylene', 'inflatable', 'steel', 'composite', 'other'] as const;
export type HullMaterial = (typeof hullMaterials)[number];
