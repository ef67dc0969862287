import type { Mail } from '@tiltwright/shared/schemas/desk.ts';

/** Where a mail stands, in a few words. */
export function mailStateWords({ status, attempts }: Pick<Mail, 'status' | 'attempts'>): string {
  switch (status) {
    case 'queued':
      return attempts === 0 ? 'waits' : `waits, tried ${attempts === 1 ? 'once' : `${attempts} times`}`;
    case 'sending':
      return 'on its way';
    case 'sent':
      return 'sent';
    case 'failed':
      return 'not delivered';
    default:
      return status satisfies never;
  }
}
