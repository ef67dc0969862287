import { act, fireEvent, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { Link, MemoryRouter, Route, Routes } from 'react-router';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { FocusedAddress, PageTitle } from './page-title.tsx';

beforeEach(() => vi.stubGlobal('scrollTo', vi.fn()));

/** Its heading changes once its data is there. */
function Sheet() {
  const [name, setName] = useState<string | null>(null);
  return (
    <>
      {name === null ? <PageTitle key="pending" title="A boat’s sheet" /> : <PageTitle key="there" title={name} />}
      <button type="button" onClick={() => setName('Heron 42')}>
        Data comes
      </button>
    </>
  );
}

function show() {
  render(
    <FocusedAddress value={{ current: { address: '/', moved: false } }}>
      <MemoryRouter>
        <Routes>
          <Route
            path="/"
            element={
              <>
                <PageTitle title="Which boat?" />
                <Link to="/fit">Check a fit</Link>
                <Link to="/hulls/1">A sheet</Link>
              </>
            }
          />
          <Route path="/fit" element={<PageTitle title="Check a fit" />} />
          <Route path="/hulls/1" element={<Sheet />} />
        </Routes>
      </MemoryRouter>
    </FocusedAddress>,
  );
}

describe('the title of a page', () => {
  it('leaves the focus alone on the first page of a visit', () => {
    show();
    expect(screen.getByRole('heading', { name: 'Which boat?' })).not.toHaveFocus();
    expect(document.title).toBe('Which boat? · Tiltwright');
  });

  it('takes the focus after a step to another page', async () => {
    show();
    await userEvent.click(screen.getByRole('link', { name: 'Check a fit' }));
    expect(screen.getByRole('heading', { name: 'Check a fit' })).toHaveFocus();
    expect(document.title).toBe('Check a fit · Tiltwright');
  });

  it('hands the focus on when the heading is replaced by another', async () => {
    show();
    await userEvent.click(screen.getByRole('link', { name: 'A sheet' }));
    expect(screen.getByRole('heading', { name: 'A boat’s sheet' })).toHaveFocus();
    // Without moving the focus to the button: data comes by itself.
    act(() => fireEvent.click(screen.getByRole('button')));
    expect(screen.getByRole('heading', { name: 'Heron 42' })).toHaveFocus();
  });
});
