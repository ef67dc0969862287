import type { FitAnswer } from '@tiltwright/shared/schemas/fit.ts';
import { useEffect, useRef, useState } from 'react';
import type { FitJob, FitResult } from './fit-job.ts';

type Lane = 'live' | 'full';
export type Ask = Omit<FitJob, 'id'>;
/** An answer with the question it belongs to. */
interface Reckoned {
  ask: Ask;
  answer: FitAnswer;
}

interface Results {
  /** The last that was worked out, of either lane. */
  newest: Reckoned | null;
  full: Reckoned | null;
}

function withResult(before: Results, lane: Lane, result: Reckoned): Results {
  return { newest: result, full: lane === 'full' ? result : before.full };
}

/** False in a browser without workers, or once the worker could not be had: then the server is asked for everything. */
const canReckon = () => typeof Worker !== 'undefined';

/**
 * Works checks out beside the page, one at a time: `live` ones come first and only the newest of each lane is done.
 * Null asks for nothing. `failed` is true from the first check that could not be worked out here.
 */
export function useReckoner(live: Ask | null, full: Ask | null): Results & { failed: boolean } {
  const [done, setDone] = useState<Results>({ newest: null, full: null });
  const [failed, setFailed] = useState(() => !canReckon());
  const worker = useRef<Worker | null>(null);
  const waiting = useRef<Partial<Record<Lane, Ask>>>({});
  const running = useRef<{ id: number; lane: Lane; ask: Ask } | null>(null);
  const count = useRef(0);

  const next = useRef(() => {});
  next.current = () => {
    if (running.current) return;
    const lane: Lane = waiting.current.live ? 'live' : 'full';
    const ask = waiting.current[lane];
    if (!ask) return;
    delete waiting.current[lane];
    const id = ++count.current;
    running.current = { id, lane, ask };
    worker.current ??= start(
      (result) => {
        const was = running.current;
        running.current = null;
        if (was?.id === result.id) {
          const { answer } = result;
          if (answer) setDone((before) => withResult(before, was.lane, { ask: was.ask, answer }));
          else setFailed(true);
        }
        next.current();
      },
      () => setFailed(true),
    );
    worker.current.postMessage({ id, ...ask } satisfies FitJob);
  };

  useEffect(() => {
    if (failed || !live) return;
    waiting.current.live = live;
    next.current();
  }, [live, failed]);
  useEffect(() => {
    if (failed || !full) return;
    waiting.current.full = full;
    next.current();
  }, [full, failed]);
  useEffect(
    () => () => {
      worker.current?.terminate();
      worker.current = null;
      running.current = null;
    },
    [],
  );
  return { ...done, failed };
}

function start(onResult: (result: FitResult) => void, onFailure: () => void): Worker {
  const worker = new Worker(new URL('./fit-worker.ts', import.meta.url), { type: 'module' });
  worker.onmessage = ({ data }: MessageEvent<FitResult>) => onResult(data);
  worker.onerror = onFailure;
  return worker;
}
