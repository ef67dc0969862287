import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import type { ListedRow } from '../api/list-import-rows.ts';
import { withTouched } from '../touched-rows.ts';
import { RowTable } from './row-table.tsx';

const wrong: ListedRow = {
  n: 4,
  fate: 'error',
  name: 'Testyard Smew',
  record: null,
  errors: [{ column: 'form', value: 'semi-vee', code: 'not-a-choice', message: 'Not a form.' }],
  cautions: [],
  changes: [],
  cells: { Shape: 'semi-vee' },
  edits: {},
  decision: null,
  resolution: null,
};
const held: ListedRow = {
  ...wrong,
  n: 5,
  fate: 'conflict',
  name: 'Testyard Coot',
  record: 'hul_9',
  errors: [{ column: 'deadrise_deg', value: '12', code: 'better-based-stands', message: '11 stands, which is measured.' }],
};

function show(row: ListedRow, after: Partial<ListedRow>) {
  const sent: { method: string; path: string; body: unknown }[] = [];
  let now: ListedRow[] = [row];
  vi.stubGlobal('fetch', async (request: Request) => {
    if (request.method === 'GET') return Response.json({ data: now, next: null });
    const { pathname } = new URL(request.url);
    sent.push({ method: request.method, path: pathname, body: await request.json() });
    now = [];
    return Response.json(pathname.endsWith('/fixes') ? { rows: 3 } : { ...row, errors: [], ...after });
  });
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <RowTable id="imp_1" table="hulls" fate={row.fate} status="checked" />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return sent;
}

afterEach(() => vi.unstubAllGlobals());

describe('a row that waits for a decision', () => {
  it('is mended in its place, which keeps the focus though the list holds it no more', async () => {
    const sent = show(wrong, { fate: 'new', edits: { form: 'modified-v' } });
    const field = await screen.findByLabelText(/Row 4, Form/);
    expect(field).toHaveValue('semi-vee');
    await userEvent.clear(field);
    await userEvent.type(field, 'modified-v{Enter}');
    expect(await screen.findByText('Mended: row 4 is new now.')).toBeInTheDocument();
    expect(sent).toEqual([{ method: 'PATCH', path: '/api/v1/imports/imp_1/rows/4', body: { cells: { form: 'modified-v' } } }]);
    await vi.waitFor(() => expect(screen.getByText('Mended: row 4 is new now.')).toHaveFocus());
    expect(screen.getByRole('button', { name: /Take back, row 4/ })).toBeInTheDocument();
  });

  it('is mended with all cells that read the same', async () => {
    const sent = show(wrong, {});
    const field = await screen.findByLabelText(/Row 4, Form/);
    await userEvent.clear(field);
    await userEvent.type(field, 'modified-v');
    await userEvent.click(screen.getByLabelText(/every other cell here that reads “semi-vee”/));
    await userEvent.click(screen.getByRole('button', { name: 'Mend' }));
    expect(await screen.findByText('Form: “semi-vee” is read as “modified-v” now, in 3 rows.')).toBeInTheDocument();
    expect(sent).toEqual([
      { method: 'POST', path: '/api/v1/imports/imp_1/fixes', body: { column: 'form', from: 'semi-vee', to: 'modified-v' } },
    ]);
  });

  it('with a conflict is decided one way or the other', async () => {
    const sent = show(held, { fate: 'changed', resolution: 'row' });
    await userEvent.click(await screen.findByRole('button', { name: /Take this row’s values/ }));
    expect(await screen.findByText('Row 5 replaces what stood.')).toBeInTheDocument();
    expect(sent[0]).toMatchObject({ path: '/api/v1/imports/imp_1/rows/5', body: { resolution: 'row' } });
    expect(screen.getByRole('button', { name: /Decide again/ })).toBeInTheDocument();
  });

  it('with a caution is ticked, or left out', async () => {
    const caution = { column: 'dry_mass_kg', value: '', code: 'outlier', message: 'Heavy for its length.' };
    const sent = show({ ...wrong, fate: 'new', errors: [], cautions: [caution] }, { fate: 'new', cautions: [caution], decision: 'accept' });
    await userEvent.click(await screen.findByLabelText(/row 4 is right as it stands/));
    expect(await screen.findByText('Row 4 will be published as it is.')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: /Leave it out/ }));
    await vi.waitFor(() => expect(sent.map(({ body }) => body)).toEqual([{ decision: 'accept' }, { decision: 'skip' }]));
  });
});

describe('rows that were touched', () => {
  it('stay in the file’s order; what the list says counts', () => {
    const row = (n: number, name: string): ListedRow => ({ ...wrong, n, name });
    const touched = new Map([row(3, 'mended'), row(2, 'old')].map((one) => [one.n, one]));
    const names = withTouched([row(2, 'two'), row(4, 'four')], touched).map(({ name }) => name);
    expect(names).toEqual(['two', 'mended', 'four']);
  });
});
