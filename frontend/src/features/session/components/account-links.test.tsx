import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import { AccountLinks } from './account-links.tsx';

const account = {
  id: 'usr_1',
  email: 'a@tiltwright.example',
  name: 'A. Rigger',
  roles: ['steward'],
  createdAt: '2026-05-04T08:00:00.000Z',
};

afterEach(() => vi.unstubAllGlobals());

describe('who is signed in', () => {
  it('is named, and is forgotten with all that was read once signed out', async () => {
    const client = createQueryClient();
    client.setQueryData(['imports'], { data: ['secret'], next: null });
    vi.stubGlobal('fetch', async (request: Request) =>
      request.method === 'DELETE' ? new Response(null, { status: 204 }) : Response.json({ account, expiresAt: null }),
    );
    render(
      <QueryClientProvider client={client}>
        <MemoryRouter initialEntries={['/steward']}>
          <AccountLinks />
        </MemoryRouter>
      </QueryClientProvider>,
    );
    expect(await screen.findByText('A. Rigger')).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Sign out' }));
    expect(await screen.findByRole('link', { name: 'Sign in' })).toBeInTheDocument();
    expect(screen.queryByText('A. Rigger')).not.toBeInTheDocument();
    expect(client.getQueryData(['imports'])).toBeUndefined();
  });
});
