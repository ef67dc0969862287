// One try of one delivery: one request, no redirect followed, five seconds, the answer's body thrown away.
import http from 'node:http';
import https from 'node:https';
import { isIPv6, type LookupFunction } from 'node:net';
import { checkTarget, type TargetRules, UnsafeTarget } from './safe-target.ts';

export interface Try {
  /** HTTP status; null where no answer came. */
  status: number | null;
  error: string | null;
  ms: number;
}

const patienceMs = 5000;

export async function sendOnce(target: string, headers: Record<string, string>, body: string, rules: TargetRules): Promise<Try> {
  const began = performance.now();
  const ended = (status: number | null, error: string | null): Try => ({ status, error, ms: Math.round(performance.now() - began) });
  try {
    const { url, addresses } = await checkTarget(target, rules);
    const status = await post(url, addresses[0]!, headers, body);
    return ended(status, status >= 200 && status < 300 ? null : `answered ${status}`);
  } catch (error) {
    return ended(null, error instanceof UnsafeTarget ? error.message : wordsOf(error as NodeJS.ErrnoException));
  }
}

function post(url: URL, address: string, headers: Record<string, string>, body: string): Promise<number> {
  const family = isIPv6(address) ? 6 : 4;
  // The name goes into Host and into the certificate's check; the connection goes to the address that was checked.
  const lookup: LookupFunction = (_host, options, done) => (options.all ? done(null, [{ address, family }]) : done(null, address, family));
  return new Promise((resolve, reject) => {
    const request = (url.protocol === 'https:' ? https : http).request(
      url,
      {
        method: 'POST',
        lookup,
        agent: false,
        signal: AbortSignal.timeout(patienceMs),
        headers: {
          ...headers,
          'content-type': 'application/json',
          'content-length': Buffer.byteLength(body),
          'user-agent': 'Tiltwright-Webhooks',
        },
      },
      (response) => {
        resolve(response.statusCode ?? 0);
        // Nothing of it is of use, and it may be endless.
        response.destroy();
      },
    );
    request.once('error', reject);
    request.end(body);
  });
}

function wordsOf({ name, code, message }: NodeJS.ErrnoException): string {
  if (name === 'TimeoutError' || name === 'AbortError') return `no answer within ${patienceMs / 1000} s`;
  return code ? `no connection (${code})` : message.slice(0, 200);
}
