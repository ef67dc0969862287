import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { beforeEach, describe, expect, it } from 'vitest';
import { metricUnits, setUnits } from '../../lib/unit-choice.ts';
import { UnitInput } from './unit-input.tsx';

let last: number | null | undefined;

function Offset({ start = 380 as number | null, blank = true }) {
  const [value, setValue] = useState<number | null>(start);
  return (
    <>
      <UnitInput
        label="Off centre"
        quantity="lengthMm"
        value={value}
        onChange={(next) => {
          last = next;
          setValue(next);
        }}
        min={-1000}
        max={1000}
        step={5}
        blank={blank}
      />
      <button type="button" onClick={() => setValue(100)}>
        Elsewhere
      </button>
    </>
  );
}

const field = () => screen.getByLabelText<HTMLInputElement>('Off centre');

beforeEach(() => {
  last = undefined;
  act(() => setUnits(metricUnits));
});

describe('a number with its unit', () => {
  it('shows the unit with the number and gives the stored unit', async () => {
    render(<Offset />);
    expect(field()).toHaveValue('380\u00a0mm');
    await userEvent.clear(field());
    await userEvent.type(field(), '415');
    expect(last).toBe(415);
    await userEvent.tab();
    expect(field()).toHaveValue('415\u00a0mm');
  });

  it('takes a bare number in inches once inches are chosen: 15 in are 381 mm', async () => {
    setUnits({ ...metricUnits, length: 'in' });
    render(<Offset start={null} />);
    await userEvent.type(field(), '15');
    expect(last).toBeCloseTo(381, 9);
  });

  it('says what does not read, keeps it, and keeps the last good value', async () => {
    render(<Offset />);
    await userEvent.clear(field());
    await userEvent.type(field(), 'about that');
    await userEvent.tab();
    expect(field()).toHaveValue('about that');
    expect(field()).toBeInvalid();
    expect(field()).toHaveAccessibleDescription(/about that/);
    expect(last).toBeNull();
  });

  it('names the bound that a number oversteps and does not pass it on', async () => {
    render(<Offset start={10} />);
    await userEvent.clear(field());
    last = undefined;
    await userEvent.paste('1200');
    expect(field()).toHaveAccessibleDescription('At most 1000\u00a0mm.');
    expect(last).toBeUndefined();
  });

  it('moves by its step with the buttons and the arrow keys, and stops at the bound', async () => {
    render(<Offset start={993} />);
    await userEvent.click(screen.getByRole('button', { name: 'More: Off centre' }));
    expect(last).toBe(1000);
    expect(screen.getByRole('button', { name: 'More: Off centre' })).toBeDisabled();
    await userEvent.type(field(), '{ArrowDown}');
    expect(last).toBe(995);
  });

  it('steps a quarter of an inch where inches are read', async () => {
    setUnits({ ...metricUnits, length: 'in' });
    render(<Offset start={254} />);
    await userEvent.click(screen.getByRole('button', { name: 'Less: Off centre' }));
    expect(last).toBeCloseTo(9.75 * 25.4, 6);
  });

  it('follows a value that was set elsewhere, even over something that did not read', async () => {
    render(<Offset blank={false} />);
    await userEvent.clear(field());
    await userEvent.paste('nonsense');
    await userEvent.click(screen.getByRole('button', { name: 'Elsewhere' }));
    expect(field()).toHaveValue('100\u00a0mm');
    expect(field()).toBeValid();
  });
});
