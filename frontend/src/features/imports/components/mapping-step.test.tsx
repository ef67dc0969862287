import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { Import } from '@tiltwright/shared/schemas/import.ts';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import type { Mapping, MappingSheet } from '../api/get-mapping.ts';
import { ImportSheet } from './import-sheet.tsx';

const record: Import = {
  id: 'imp_1',
  table: 'trim-points',
  status: 'uploaded',
  fileName: 'runs.csv',
  bytes: 90,
  sha256: 'a'.repeat(64),
  sameFileAs: null,
  encoding: 'utf-8',
  delimiter: ';',
  rows: 1,
  checkedRows: 0,
  counts: null,
  headerRow: 2,
  needsMapping: true,
  unknownColumns: [],
  edition: null,
  problem: null,
  createdAt: '2026-05-04T08:00:00.000Z',
  createdBy: 'usr_1',
};
const columns: Mapping['columns'] = [
  { at: 0, to: 'hull_model', erase: false },
  { at: 1, to: 'speed_kn', unit: 'mph', erase: false },
  { at: 2, erase: false },
];
const sheetOf = (mapping: Mapping, origin: MappingSheet['origin']): MappingSheet => ({
  top: [
    ['Runs in May', '', ''],
    ['Boat', 'Speed', 'Bow up'],
    ['Heron', '20', 'about 4'],
  ],
  header: ['Boat', 'Speed', 'Bow up'],
  mapping,
  origin,
  missing: mapping.constants.hull_maker ? [] : ['hull_maker'],
  leftOut: [],
  preview: [
    {
      n: 3,
      cells: [
        { column: 'hull_model', text: 'Heron', value: 'Heron', problem: null },
        { column: 'trim_deg', text: 'about 4', value: null, problem: '“about 4” does not read as a number.' },
      ],
      problems: [],
    },
  ],
});

function show() {
  const sent: { method: string; path: string; body: unknown }[] = [];
  vi.stubGlobal('fetch', async (request: Request) => {
    const { pathname, search } = new URL(request.url);
    const body = request.method === 'PUT' ? await request.json() : null;
    sent.push({ method: request.method, path: pathname + search, body });
    if (request.method === 'PUT') return Response.json(sheetOf(body as Mapping, 'saved'));
    if (pathname.endsWith('/check')) return Response.json({ ...record, status: 'checking' }, { status: 202 });
    if (pathname.endsWith('/mapping')) return Response.json(sheetOf({ headerRow: 2, columns, constants: {} }, 'suggested'));
    return Response.json(record);
  });
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <ImportSheet record={record} fate={undefined} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return sent;
}
const lastPut = (sent: ReturnType<typeof show>) => sent.filter(({ method }) => method === 'PUT').at(-1)?.body;

afterEach(() => vi.unstubAllGlobals());

describe('a file with headings of its own', () => {
  it('shows what is suggested, what is missing and which cell cannot be read', async () => {
    show();
    expect(await screen.findByText(/Suggested by the words of the headings/)).toBeInTheDocument();
    expect(screen.getByRole('radio', { name: /Boat · Speed · Bow up/ })).toBeChecked();
    const speed = within(screen.getByRole('group', { name: 'Speed' }));
    expect(speed.getByLabelText('Holds')).toHaveDisplayValue('Speed, kn (needed)');
    expect(speed.getByLabelText('Unit of bare numbers')).toHaveDisplayValue('miles an hour');
    expect(screen.getByText('“about 4” does not read as a number.')).toBeInTheDocument();
    expect(screen.getByText('1 of the first 1 row has something that cannot be read yet.')).toBeInTheDocument();
    expect(screen.getByText(/Nothing fills/)).toBeInTheDocument();
  });

  it('keeps each choice, and checks with what was chosen', async () => {
    const sent = show();
    const bow = within(await screen.findByRole('group', { name: 'Bow up' }));
    await userEvent.selectOptions(bow.getByLabelText('Holds'), 'trim_deg');
    await vi.waitFor(() =>
      expect(lastPut(sent)).toMatchObject({ headerRow: 2, columns: [columns[0], columns[1], { at: 2, to: 'trim_deg', erase: false }] }),
    );
    await userEvent.type(screen.getByLabelText('Hull maker'), 'Testyard');
    await userEvent.click(screen.getByRole('button', { name: 'Check the rows' }));
    await vi.waitFor(() => expect(sent.some(({ path }) => path.endsWith('/imports/imp_1/check'))).toBe(true));
    expect(lastPut(sent)).toMatchObject({ constants: { hull_maker: 'Testyard' } });
  });

  it('does not check what still lacks a needed column', async () => {
    const sent = show();
    await userEvent.click(await screen.findByRole('button', { name: 'Check the rows' }));
    await vi.waitFor(() => expect(sent.some(({ method }) => method === 'PUT')).toBe(true));
    expect(sent.some(({ path }) => path.endsWith('/check'))).toBe(false);
    expect(screen.getByText(/Nothing fills/)).toBeInTheDocument();
  });

  it('asks how the file reads from another row of headings', async () => {
    const sent = show();
    await userEvent.click(await screen.findByRole('radio', { name: /row 1/ }));
    await vi.waitFor(() => expect(sent.some(({ path }) => path.endsWith('/mapping?headerRow=1'))).toBe(true));
    expect(sent.some(({ method }) => method === 'PUT')).toBe(false);
  });
});
