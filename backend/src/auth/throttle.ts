// Slows down guessing: of passwords by account and address together and by address alone, of codes by account.
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { ApiProblem } from '../errors.ts';

export interface SignInThrottle {
  /** @throws ApiProblem too-many-requests with Retry-After */
  beforeTry(email: string, address: string): Promise<void>;
  /** Before a second factor's code: by account alone, since the password is known to whoever gets here. @throws as above */
  beforeCode(userId: string): Promise<void>;
  afterSuccess(email: string, address: string, userId: string): Promise<void>;
}

/**
 * Ten tries an account and address in 15 minutes, a hundred an address: room for a workshop behind one line, none for a
 * word list. Ten codes an account: of a million codes, three good at any time, that leaves years to a guesser.
 */
export function signInThrottle(): SignInThrottle {
  const byAccount = new RateLimiterMemory({ points: 10, duration: 900 });
  const byAddress = new RateLimiterMemory({ points: 100, duration: 900 });
  const codes = new RateLimiterMemory({ points: 10, duration: 900 });
  const consume = async (limiter: RateLimiterMemory, key: string) => {
    try {
      await limiter.consume(key);
    } catch (limit) {
      if (!(limit instanceof RateLimiterRes)) throw limit;
      const seconds = Math.max(1, Math.ceil(limit.msBeforeNext / 1000));
      throw new ApiProblem('too-many-requests', `Too many tries; wait ${Math.ceil(seconds / 60)} minutes.`, [], {
        'Retry-After': String(seconds),
      });
    }
  };
  return {
    async beforeTry(email, address) {
      await consume(byAddress, address);
      await consume(byAccount, `${email} ${address}`);
    },
    beforeCode: (userId) => consume(codes, userId),
    async afterSuccess(email, address, userId) {
      await byAccount.delete(`${email} ${address}`);
      await codes.delete(userId);
    },
  };
}
