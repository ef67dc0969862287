import path from 'node:path';

// Both backend/src/paths.ts and the bundle backend/dist/server.js lie two folders below the top.
export const topFolder = path.resolve(import.meta.dirname, '../..');
export const migrationsFolder = path.join(topFolder, 'backend/src/db/migrations');
export const seedsFolder = path.join(topFolder, 'seeds');
export const siteFolder = path.join(topFolder, 'frontend/dist');
