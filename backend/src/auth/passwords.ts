import { hash, verify } from '@node-rs/argon2';

// argon2id with the memory and time cost of RFC 9106's second recommendation scaled to a small server:
// 19 MiB, 2 passes, 1 lane (OWASP password storage cheat sheet, from memory). Some 30 ms a check here.
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export const hashPassword = (password: string) => hash(password, cost);

let decoy: Promise<string> | undefined;

/** Takes as long for an unknown account as for a known one. */
export async function checkPassword(stored: string | undefined, password: string): Promise<boolean> {
  decoy ??= hashPassword('nobody has this password');
  const matches = await verify(stored ?? (await decoy), password);
  return matches && stored !== undefined;
}
