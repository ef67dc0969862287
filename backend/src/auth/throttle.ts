// Slows down guessing of passwords: by account and address together, and by address alone.
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { ApiProblem } from '../errors.ts';

export interface SignInThrottle {
  /** @throws ApiProblem too-many-requests with Retry-After */
  beforeTry(email: string, address: string): Promise<void>;
  afterSuccess(email: string, address: string): Promise<void>;
}

/** Ten tries an account and address in 15 minutes, a hundred an address: room for a workshop behind one line, none for a word list. */
export function signInThrottle(): SignInThrottle {
  const byAccount = new RateLimiterMemory({ points: 10, duration: 900 });
  const byAddress = new RateLimiterMemory({ points: 100, duration: 900 });
  return {
    async beforeTry(email, address) {
      try {
        await byAddress.consume(address);
        await byAccount.consume(`${email} ${address}`);
      } catch (limit) {
        if (!(limit instanceof RateLimiterRes)) throw limit;
        const seconds = Math.max(1, Math.ceil(limit.msBeforeNext / 1000));
        throw new ApiProblem('too-many-requests', `Too many tries to sign in; wait ${Math.ceil(seconds / 60)} minutes.`, [], {
          'Retry-After': String(seconds),
        });
      }
    },
    async afterSuccess(email, address) {
      await byAccount.delete(`${email} ${address}`);
    },
  };
}
