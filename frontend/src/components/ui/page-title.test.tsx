import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { Link, MemoryRouter, Route, Routes } from 'react-router';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { FocusedAddress, PageTitle } from './page-title.tsx';

beforeEach(() => vi.stubGlobal('scrollTo', vi.fn()));

function show() {
  render(
    <FocusedAddress value={{ current: '/' }}>
      <MemoryRouter>
        <Routes>
          <Route
            path="/"
            element={
              <>
                <PageTitle title="Which boat?" />
                <Link to="/fit">Check a fit</Link>
              </>
            }
          />
          <Route path="/fit" element={<PageTitle title="Check a fit" />} />
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
    await userEvent.click(screen.getByRole('link'));
    expect(screen.getByRole('heading', { name: 'Check a fit' })).toHaveFocus();
    expect(document.title).toBe('Check a fit · Tiltwright');
  });
});
