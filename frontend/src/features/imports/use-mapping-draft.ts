import { useEffect, useRef, useState } from 'react';
import { useSearchParams } from 'react-router';
import { useSettled } from '../../lib/use-settled.ts';
import { useCheckImport } from './api/check-import.ts';
import type { Mapping, MappingSheet } from './api/get-mapping.ts';
import { useSaveMapping } from './api/save-mapping.ts';
import { sendable } from './mapping-draft.ts';

/** A choice is kept, and the first rows read with it, once choosing rests this long. */
const restMs = 400;

/** The mapping as it is being chosen; the server keeps each step and answers with the first rows as they then read. */
export function useMappingDraft(id: string, first: MappingSheet, firstDraft: Mapping) {
  const [draft, setDraft] = useState(firstDraft);
  const [sheet, setSheet] = useState(first);
  const save = useSaveMapping(id);
  const check = useCheckImport(id);
  const [, setSearch] = useSearchParams();
  const sent = useRef(firstDraft);
  const settled = useSettled(draft, restMs);
  const { mutate, mutateAsync } = save;

  useEffect(() => {
    if (settled === sent.current) return;
    sent.current = settled;
    mutate(sendable(settled), { onSuccess: setSheet });
  }, [settled, mutate]);

  /** What is chosen is kept first, though nothing was changed: a suggestion counts only with a person's word. */
  const keepAndCheck = async () => {
    sent.current = draft;
    try {
      const kept = await mutateAsync(sendable(draft));
      setSheet(kept);
      if (kept.missing.length > 0) return;
      // The address asks for the columns no longer: the checked rows come next.
      setSearch({}, { replace: true });
      check.mutate();
    } catch {
      // The mutation itself tells the error, which stands beside the column.
    }
  };

  return { draft, setDraft, sheet, save, check, keepAndCheck, isReading: save.isPending || settled !== draft };
}
