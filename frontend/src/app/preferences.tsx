import { useEffect, useRef } from 'react';
import { ChoiceRow } from '../components/ui/select.tsx';
import { setTheme, type Theme, themes, useTheme } from '../lib/theme.ts';
import { lengthUnits, massUnits, setUnits, speedUnits, useUnits } from '../lib/unit-choice.ts';

const asChoices = <T extends string>(values: readonly T[]) => values.map((value) => ({ value, label: value }));
const themeWords: Record<Theme, string> = { system: 'as the device', light: 'light', dark: 'dark' };

/** Units and light or dark, chosen once and remembered on this device. */
export function Preferences() {
  const units = useUnits();
  const theme = useTheme();
  const details = useRef<HTMLDetailsElement>(null);

  useEffect(() => {
    const close = (event: Event) => {
      const box = details.current;
      if (!box?.open) return;
      if (event instanceof KeyboardEvent) {
        if (event.key !== 'Escape') return;
        box.querySelector('summary')?.focus();
      } else if (box.contains(event.target as Node)) return;
      box.open = false;
    };
    document.addEventListener('pointerdown', close);
    document.addEventListener('keydown', close);
    return () => {
      document.removeEventListener('pointerdown', close);
      document.removeEventListener('keydown', close);
    };
  }, []);

  return (
    <details ref={details} className="relative">
      <summary className="flex min-h-11 list-none items-center px-2 text-ink-2 underline underline-offset-4 hover:text-ink [&::-webkit-details-marker]:hidden">
        <span className="sr-only">Units and light: </span>
        {units.length} · {units.speed} · {units.mass}
      </summary>
      <div className="z-10 flex flex-col gap-4 border max-tablet:fixed max-tablet:inset-x-4 max-tablet:top-14 tablet:absolute tablet:right-0 tablet:w-72 border-ink bg-sheet p-4">
        <ChoiceRow
          legend="Lengths"
          name="length-unit"
          choices={asChoices(lengthUnits)}
          value={units.length}
          onChange={(length) => setUnits({ ...units, length })}
        />
        <ChoiceRow
          legend="Speed"
          name="speed-unit"
          choices={asChoices(speedUnits)}
          value={units.speed}
          onChange={(speed) => setUnits({ ...units, speed })}
        />
        <ChoiceRow
          legend="Mass"
          name="mass-unit"
          choices={asChoices(massUnits)}
          value={units.mass}
          onChange={(mass) => setUnits({ ...units, mass })}
        />
        <ChoiceRow
          legend="Paper"
          name="theme"
          choices={themes.map((value) => ({ value, label: themeWords[value] }))}
          value={theme}
          onChange={setTheme}
        />
      </div>
    </details>
  );
}
