import { QueryClientProvider } from '@tanstack/react-query';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { createQueryClient } from '../../../lib/query-client.ts';
import { SignInForm } from './sign-in-form.tsx';

const onSignedIn = vi.fn();

function answerWith(status: number, body: unknown, type = 'application/json') {
  const sent: Request[] = [];
  vi.stubGlobal('fetch', async (request: Request) => {
    sent.push(request);
    return new Response(JSON.stringify(body), { status, headers: { 'content-type': type } });
  });
  return sent;
}

function show() {
  render(
    <QueryClientProvider client={createQueryClient()}>
      <MemoryRouter>
        <SignInForm onSignedIn={onSignedIn} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
}

const problem = (status: number, code: string) => ({ type: code, title: code, status, detail: code, instance: '/', code, issues: [] });

async function fillIn() {
  await userEvent.type(screen.getByLabelText('E-mail address'), 'sailor@tiltwright.example');
  await userEvent.type(screen.getByLabelText('Password'), 'loft-floor-2026');
  await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
}

afterEach(() => {
  vi.unstubAllGlobals();
  onSignedIn.mockReset();
});

describe('signing in', () => {
  it('sends address and password and goes on', async () => {
    const sent = answerWith(200, { account: null, expiresAt: null });
    show();
    await fillIn();
    await vi.waitFor(() => expect(onSignedIn).toHaveBeenCalledOnce());
    expect(await sent[0]?.json()).toEqual({ email: 'sailor@tiltwright.example', password: 'loft-floor-2026' });
  });

  it('sends nothing without an address, and puts the focus on the first wrong field', async () => {
    const sent = answerWith(200, {});
    show();
    await userEvent.click(screen.getByRole('button', { name: 'Sign in' }));
    await vi.waitFor(() => expect(screen.getByLabelText('E-mail address')).toHaveFocus());
    expect(screen.getByLabelText('E-mail address')).toHaveAccessibleDescription('This is not an e-mail address.');
    expect(sent).toHaveLength(0);
  });

  it('says that the password is wrong and keeps what was typed', async () => {
    answerWith(401, problem(401, 'wrong-credentials'), 'application/problem+json');
    show();
    await fillIn();
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail address or password is wrong.');
    expect(screen.getByLabelText('E-mail address')).toHaveValue('sailor@tiltwright.example');
    expect(onSignedIn).not.toHaveBeenCalled();
  });

  it('says so when nothing answers', async () => {
    vi.stubGlobal('fetch', async () => {
      throw new TypeError('failed to fetch');
    });
    show();
    await fillIn();
    expect(await screen.findByRole('alert')).toHaveTextContent('No connection.');
  });
});
