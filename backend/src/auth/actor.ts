import type { Role, Scope } from '@tiltwright/shared/schemas/account.ts';

/** Who is asking. */
export type Actor =
  | { kind: 'visitor'; hadSession: boolean }
  | {
      kind: 'person';
      userId: string;
      roles: readonly Role[];
      /** The site asks staff for a second factor and this account has none: staff work is refused until it does. */
      factorLacking: boolean;
    }
  | {
      kind: 'key';
      keyId: string;
      userId: string;
      roles: readonly Role[];
      scopes: readonly Scope[] /** Of a browser key; null for a server key. */;
      origins: readonly string[] | null;
    };

/** The id history and audit keep: opaque, it survives the person's leaving. */
export const actorId = (actor: Actor) => (actor.kind === 'visitor' ? 'visitor' : actor.userId);
