// Links that open something: 256 random bits, sent once by mail and stored as SHA-256. They stand behind the # of an
// address, where no log and no other site reads them.
import { hashSecret, newSecret } from './keys.ts';

export interface NewToken {
  token: string;
  tokenHash: string;
}

export function newToken(): NewToken {
  const token = newSecret();
  return { token, tokenHash: hashSecret(token) };
}

export const tokenLink = (siteUrl: string, page: string, token: string) => `${siteUrl}/${page}#token=${token}`;

export const hoursLater = (now: Date, hours: number) => new Date(now.getTime() + hours * 3_600_000).toISOString();
