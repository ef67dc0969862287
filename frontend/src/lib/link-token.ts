import { useState } from 'react';
import { useLocation } from 'react-router';
import { storedChoice } from './stored-choice.ts';

/** What stands behind `#token=` in a mail's link; browsers send that part to nobody. Empty where the link is not whole. */
export const tokenIn = (hash: string) => /^#token=([\w-]{20,200})$/.exec(hash)?.[1] ?? '';

/** The token of the address the page was opened with. */
export function useLinkToken(): string {
  const { hash } = useLocation();
  const [token] = useState(() => tokenIn(hash));
  return tokenIn(hash) || token;
}

/** Where someone was on their way to when they asked for an account: the mail's link comes back without it. */
export const wayAfterSignUp = storedChoice<string>('tiltwright.after-sign-up', (stored) => (typeof stored === 'string' ? stored : ''));
