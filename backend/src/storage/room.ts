// A reserve of free space is kept, so that a full disk never takes reading and signing in with it.
import { statfs } from 'node:fs/promises';
import type { Config } from '../config.ts';
import { ApiProblem } from '../errors.ts';

export interface Room {
  freeBytes: number;
  totalBytes: number;
  belowReserve: boolean;
}

type Settings = Pick<Config, 'dataFolder' | 'freeSpaceReserveBytes'>;

export async function readRoom({ dataFolder, freeSpaceReserveBytes }: Settings): Promise<Room> {
  const { bavail, blocks, bsize } = await statfs(dataFolder);
  const freeBytes = bavail * bsize;
  return { freeBytes, totalBytes: blocks * bsize, belowReserve: freeBytes < freeSpaceReserveBytes };
}

/** Before anything that stores much. @throws ApiProblem storage-full */
export async function demandRoom(settings: Settings): Promise<void> {
  const { freeBytes, belowReserve } = await readRoom(settings);
  if (belowReserve) {
    throw new ApiProblem(
      'storage-full',
      `Only ${toMegabytes(freeBytes)} MB are free and ${toMegabytes(settings.freeSpaceReserveBytes)} MB are kept in reserve; nothing was stored.`,
    );
  }
}

export const toMegabytes = (bytes: number) => Math.round(bytes / 1024 / 1024);
