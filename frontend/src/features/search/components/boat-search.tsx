import { type KeyboardEvent, useId, useRef } from 'react';
import { controlClass } from '../../../components/ui/field.tsx';
import { useSettled } from '../../../lib/use-settled.ts';
import { useTextInAddress } from '../../../lib/use-text-in-address.ts';
import { Findings } from './findings.tsx';

/** Long enough to skip most keys of a word, short enough to feel at once. */
const settleMs = 150;

/** The one question of the first page: a name, answered while it is typed. What was typed stays in the address. */
export function BoatSearch() {
  const [typed, setTyped] = useTextInAddress('q', settleMs);
  const q = useSettled(typed.trim(), settleMs);
  const id = useId();
  const box = useRef<HTMLDivElement>(null);

  // The arrow keys walk from the field through the findings and back.
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const stops = [...(box.current?.querySelectorAll<HTMLElement>('input, li a') ?? [])];
    const at = stops.indexOf(document.activeElement as HTMLElement);
    const next = stops[at + (event.key === 'ArrowDown' ? 1 : -1)];
    if (at < 0 || !next) return;
    event.preventDefault();
    next.focus();
  };

  return (
    // biome-ignore lint/a11y/noStaticElementInteractions: the keys are those of the field and the links inside
    <div ref={box} onKeyDown={onKeyDown} className="flex flex-col gap-3">
      <search>
        <form onSubmit={(event) => event.preventDefault()} className="flex flex-col gap-1">
          <label htmlFor={id} className="sr-only">
            Which boat? Maker or model
          </label>
          <input
            id={id}
            type="search"
            enterKeyHint="search"
            autoComplete="off"
            autoCapitalize="off"
            spellCheck={false}
            maxLength={80}
            placeholder="Maker or model"
            aria-describedby={`${id}-help`}
            className={`${controlClass} min-h-14 text-lead`}
            value={typed}
            onChange={(event) => setTyped(event.target.value)}
          />
          <p id={`${id}-help`} className="text-note text-ink-2">
            Part of the name is enough, and slips are forgiven.
          </p>
        </form>
      </search>
      {q !== '' && typed.trim() !== '' && <Findings q={q} waiting={q !== typed.trim()} />}
    </div>
  );
}
