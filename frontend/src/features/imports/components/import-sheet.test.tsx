import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import { ImportSheet } from './import-sheet.tsx';

const checked: Import = {
  id: 'imp_1',
  table: 'hulls',
  status: 'checked',
  fileName: 'spring.csv',
  bytes: 420,
  sha256: 'a'.repeat(64),
  sameFileAs: null,
  encoding: 'utf-8',
  delimiter: ',',
  rows: 3,
  checkedRows: 3,
  counts: { new: 1, changed: 1, unchanged: 0, duplicate: 0, conflict: 0, error: 1 },
  headerRow: 1,
  needsMapping: false,
  unknownColumns: ['colour'],
  edition: null,
  problem: null,
  createdAt: '2026-05-04T08:00:00.000Z',
  createdBy: 'usr_1',
};
const row = { record: null, errors: [], cautions: [], changes: [], cells: {}, edits: {}, decision: null, resolution: null };
const rows = [
  {
    ...row,
    n: 2,
    fate: 'new',
    name: 'Testyard Heron',
    changes: [
      { field: 'maker', before: null, after: 'Testyard' },
      { field: 'deadriseDeg', before: null, after: 17 },
    ],
  },
  { ...row, n: 3, fate: 'changed', name: 'Testyard Coot', record: 'hul_9', changes: [{ field: 'deadriseDeg', before: 17, after: 19 }] },
  {
    ...row,
    n: 4,
    fate: 'error',
    name: 'Testyard Smew',
    errors: [{ column: 'deadrise_deg', value: 'steep', code: 'not-a-number', message: 'Not a number.' }],
  },
];

function server(publish: () => Response) {
  const sent: Request[] = [];
  vi.stubGlobal('fetch', async (request: Request) => {
    sent.push(request);
    return request.method === 'POST' ? publish() : Response.json({ data: rows, next: null });
  });
  return sent;
}

function show(record: Import = checked) {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <ImportSheet record={record} fate={undefined} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

afterEach(() => vi.unstubAllGlobals());

describe('a checked table', () => {
  it('says what would be published and what is left out', () => {
    server(() => Response.json({}));
    show();
    expect(screen.getByText('1 new and 1 changed record to publish.')).toBeInTheDocument();
    expect(screen.getByText('1 row is left out: 1 wrong.')).toBeInTheDocument();
    expect(screen.getByText('colour')).toBeInTheDocument();
    expect(screen.getByRole('link', { name: /errors|wrong rows/ })).toHaveAttribute('href', '/api/v1/imports/imp_1/errors.csv');
  });

  it('shows the wrong cell with its reason, the difference of a changed row, the values of a new one', async () => {
    server(() => Response.json({}));
    show();
    const wrong = (await screen.findByText('Testyard Smew')).closest('tr')!;
    expect(within(wrong).getByText('deadrise_deg')).toBeInTheDocument();
    expect(within(wrong).getByText('steep')).toBeInTheDocument();
    expect(within(wrong).getByText('Not a number.')).toBeInTheDocument();
    const changed = screen.getByRole('link', { name: 'Testyard Coot' }).closest('tr')!;
    expect(changed).toHaveTextContent('Deadrise: 17.0°, now 19.0°');
    expect(screen.getByText('Testyard Heron').closest('tr')).toHaveTextContent('Deadrise 17.0°.');
  });

  it('is published only with a reason', async () => {
    const sent = server(() => Response.json({ edition: 7 }));
    show();
    await userEvent.click(screen.getByRole('button', { name: 'Publish …' }));
    const dialog = screen.getByRole('dialog', { name: 'Publish this table?' });
    await userEvent.click(within(dialog).getByRole('button', { name: 'Publish' }));
    expect(within(dialog).getByLabelText('Why?')).toBeInvalid();
    expect(sent.filter(({ method }) => method === 'POST')).toHaveLength(0);
    await userEvent.type(within(dialog).getByLabelText('Why?'), 'Spring list');
    await userEvent.click(within(dialog).getByRole('button', { name: 'Publish' }));
    await vi.waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    const order = sent.find(({ method }) => method === 'POST')!;
    expect(new URL(order.url).pathname).toBe('/api/v1/imports/imp_1/publish');
    expect(await order.json()).toMatchObject({ why: 'Spring list' });
  });

  it('asks for another check where the catalog has changed meanwhile', async () => {
    const body = { type: 'x', title: 'x', status: 409, detail: 'x', instance: 'x', code: 'stale-edition', issues: [] };
    server(() => Response.json(body, { status: 409 }));
    show();
    await userEvent.click(screen.getByRole('button', { name: 'Publish …' }));
    await userEvent.type(screen.getByLabelText('Why?'), 'Spring list');
    await userEvent.click(screen.getByRole('button', { name: 'Publish' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('The catalog has changed since this table was checked.');
    expect(screen.getByRole('button', { name: 'Check again' })).toBeInTheDocument();
  });
});

describe('a table in another state', () => {
  it('being checked shows how far it is', () => {
    server(() => Response.json({}));
    show({ ...checked, status: 'checking', counts: null, checkedRows: 320, rows: 800 });
    expect(screen.getByRole('status')).toHaveTextContent('320 of 800 rows checked');
    expect(screen.getByRole('progressbar')).toHaveAttribute('value', '320');
  });

  it('that could not be read says why', () => {
    server(() => Response.json({}));
    show({ ...checked, status: 'failed', counts: null, problem: { code: 'no-header', message: 'There is no heading row.' } });
    expect(screen.getByRole('alert')).toHaveTextContent('There is no heading row.');
  });
});
