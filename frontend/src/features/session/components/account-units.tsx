import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { api, bodyOf } from '../../../lib/api-client.ts';
import { setUnits, useUnits } from '../../../lib/unit-choice.ts';
import { sessionQuery, useSession } from '../api/get-session.ts';

/**
 * Keeps the units with the account: what it has is taken over when someone signs in, what is chosen while signed in is kept.
 * Shows nothing. Where keeping fails, the choice still holds on this device.
 */
export function AccountUnits() {
  const client = useQueryClient();
  const account = useSession().data?.account;
  const units = useUnits();
  const takenFor = useRef<string | null>(null);

  useEffect(() => {
    if (!account) {
      takenFor.current = null;
      return;
    }
    if (takenFor.current !== account.id) {
      takenFor.current = account.id;
      if (account.units) {
        setUnits(account.units);
        return;
      }
    }
    if (JSON.stringify(account.units) === JSON.stringify({ length: units.length, speed: units.speed, mass: units.mass })) return;
    bodyOf(api.PATCH('/me', { body: { units } })).then(
      (changed) => client.setQueryData(sessionQuery.queryKey, (session) => session && { ...session, account: changed }),
      () => undefined,
    );
  }, [account, units, client]);
  return null;
}
