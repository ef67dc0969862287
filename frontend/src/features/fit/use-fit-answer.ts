import { engineVersion } from '@tiltwright/shared/engine/version.ts';
import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { useEffect, useMemo, useRef, useState } from 'react';
import { problemKind } from '../../lib/problem.ts';
import { useSettled } from '../../lib/use-settled.ts';
import { useFit } from './api/post-fit.ts';
import { fitQuestionOf } from './fit-question.ts';
import type { FitState } from './fit-state.ts';
import { useReckoner } from './use-reckoner.ts';

/** Long enough to skip the steps of a moving slider, short enough to feel at once. */
const settleMs = 150;

export interface FitAnswered {
  /** The newest full answer; it stays while the next is on its way. */
  answer: FitAnswer | undefined;
  /** The newest answer of any kind, for what follows the hand: no chances or intervals while something moves. */
  moving: FitAnswer | undefined;
  /** True while `answer` belongs to an earlier state. */
  stale: boolean;
  /** Why the server could not be asked, where the answer needed it. */
  error: unknown;
  retry: () => void;
  /** True where the server is out of reach and the answer was worked out on this device. */
  onDevice: boolean;
}

/**
 * Answers a check. The server answers the first one; as long as page and server reckon with the same engine, what is changed
 * after that is worked out here, in a worker, by the same code: at once, without spending the visitor's share of the server.
 * Without a worker, or with another engine on the server, every question goes there.
 */
export function useFitAnswer(state: FitState, resolve: (state: FitState) => ResolvedParts | null, linkEdition: number | null): FitAnswered {
  const settled = useSettled(state, settleMs);
  const question = useMemo(() => fitQuestionOf(settled), [settled]);
  const [first] = useState(question);
  const [firstAnswer, setFirstAnswer] = useState<FitAnswer | null>(null);
  const [away, setAway] = useState(false);

  const sameEngine = firstAnswer?.engineVersion === engineVersion;
  const edition = firstAnswer?.edition ?? linkEdition ?? 0;
  const here = sameEngine || away;
  const live = useMemo(() => {
    const parts = here && state !== settled ? resolve(state) : null;
    return parts && { question: { ...fitQuestionOf(state), uncertainty: 'none' as const }, parts, edition };
  }, [here, resolve, edition, state, settled]);
  const full = useMemo(() => {
    const parts = here && (question !== first || away) ? resolve(settled) : null;
    return parts && { question, parts, edition };
  }, [here, away, resolve, edition, question, first, settled]);
  const reckoner = useReckoner(live, full);

  const onlyHere = sameEngine && !reckoner.failed;
  const server = useFit(onlyHere ? first : question);
  const served = server.data && !server.isPlaceholderData ? server.data : undefined;
  useEffect(() => {
    if (served) setFirstAnswer((before) => before ?? served);
    if (served) setAway(false);
  }, [served]);
  const kind = server.isError ? problemKind(server.error) : null;
  useEffect(() => {
    if (kind === 'offline' || kind === 'busy') setAway(true);
  }, [kind]);

  const fromHere = full && reckoner.full?.ask === full ? reckoner.full.answer : undefined;
  const fromServer = onlyHere && question !== first ? undefined : served;
  const fresh = fromHere ?? fromServer;
  const last = useRef<FitAnswer | undefined>(undefined);
  if (fresh) last.current = fresh;
  const answer = last.current;
  const stale = state !== settled || !fresh;
  return {
    answer,
    moving: stale && here && reckoner.newest ? reckoner.newest.answer : answer,
    stale,
    error: server.isError && !fromHere ? server.error : null,
    retry: () => void server.refetch(),
    onDevice: away && fromHere !== undefined,
  };
}
