import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import { BoatSearch } from './boat-search.tsx';

const boat = {
  id: 'hul_1',
  generic: false,
  revision: 1,
  edition: 1,
  status: 'published',
  supersededBy: null,
  maker: 'Testyard',
  model: 'Heron 42',
  yearFrom: 2016,
  yearTo: 2022,
  form: 'shallow-v',
  lengthM: 4.2,
  deadriseDeg: 8,
};
const motor = {
  kind: 'lower-units',
  id: 'low_1',
  maker: 'Testworks',
  model: 'T 30',
  package: null,
  yearFrom: null,
  yearTo: null,
  generic: false,
  corrected: [],
};

function answer(reply: (url: URL) => { status?: number; body: unknown }) {
  const asked: string[] = [];
  vi.stubGlobal('fetch', async (request: Request) => {
    const url = new URL(request.url);
    asked.push(`${url.pathname}${url.search}`);
    const { status = 200, body } = reply(url);
    const type = status < 400 ? 'application/json' : 'application/problem+json';
    return new Response(JSON.stringify(body), { status, headers: { 'content-type': type } });
  });
  return asked;
}

function show(start = '/') {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter initialEntries={[start]}>
        <BoatSearch />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

afterEach(() => vi.unstubAllGlobals());

describe('the search for a boat', () => {
  it('asks nothing before something is typed', () => {
    const asked = answer(() => ({ body: { data: [], next: null } }));
    show();
    expect(asked).toEqual([]);
  });

  it('asks once for a word typed in one go and leads to the sheet', async () => {
    const asked = answer(() => ({ body: { data: [boat], next: null } }));
    show();
    await userEvent.type(screen.getByRole('searchbox'), 'heron', { delay: null });
    const link = await screen.findByRole('link', { name: /Testyard Heron 42/ });
    expect(link).toHaveAttribute('href', '/hulls/hul_1');
    expect(link).toHaveTextContent('2016 – 2022 · shallow vee · 4.2 m · deadrise 8.0°');
    expect(asked).toEqual(['/api/v1/hulls?q=heron&limit=8']);
    expect(screen.getByRole('status')).toHaveTextContent('One boat found.');
  });

  it('walks from the field to the findings and back with the arrow keys', async () => {
    answer(() => ({ body: { data: [boat], next: null } }));
    show('/?q=heron');
    const link = await screen.findByRole('link', { name: /Heron 42/ });
    await userEvent.click(screen.getByRole('searchbox'));
    await userEvent.keyboard('{ArrowDown}');
    expect(link).toHaveFocus();
    await userEvent.keyboard('{ArrowUp}');
    expect(screen.getByRole('searchbox')).toHaveFocus();
  });

  it('offers other parts of that name where no boat has it', async () => {
    answer((url) => ({ body: { data: url.pathname.endsWith('/search') ? [motor] : [], next: null } }));
    show('/?q=t30');
    expect(await screen.findByText('No boat here is called “t30”.')).toBeInTheDocument();
    expect(await screen.findByRole('link', { name: /Testworks T 30/ })).toHaveAttribute('href', '/lower-units/low_1');
  });

  it('says in words that too much was asked, and keeps what was typed', async () => {
    const body = { type: 'x', title: 'x', status: 429, detail: 'x', instance: 'x', code: 'too-many-requests', issues: [] };
    answer(() => ({ status: 429, body }));
    show('/?q=heron');
    expect(await screen.findByRole('alert')).toHaveTextContent('Too many questions at once.');
    expect(screen.getByRole('searchbox')).toHaveValue('heron');
  });
});
