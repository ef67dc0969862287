import { QueryClientProvider } from '@tanstack/react-query';
import { configure, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { answerFit } from '@tiltwright/shared/questions/answer-fit.ts';
import type { ResolvedParts } from '@tiltwright/shared/questions/parts.ts';
import { FitQuestion } from '@tiltwright/shared/schemas/fit.ts';
import { createMemoryRouter, RouterProvider } from 'react-router';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { FitJob, FitResult } from '../../features/fit/fit-job.ts';
import { createQueryClient } from '../../lib/query-client.ts';
import Fit from './fit.tsx';

/** A server that answers with the product's own engine, so that page and answer belong together. */
const asked: FitQuestion[] = [];
const jobs: FitQuestion[] = [];
let down = false;

async function serve(request: Request): Promise<Response> {
  if (down) throw new TypeError('no connection');
  const { pathname } = new URL(request.url);
  if (pathname !== '/api/v1/fits') return problem(404, 'not-found', 'Nothing is kept here.');
  const question = FitQuestion.parse(await request.json());
  asked.push(question);
  if (typeof question.hull === 'string') return problem(422, 'unknown-part', 'The catalog has no such boat.');
  const parts = { hull: question.hull, lowerUnits: question.lowerUnits.map((unit) => unit.lowerUnit), transducer: question.transducer };
  return Response.json(answerFit(question, parts as ResolvedParts, { edition: 7 }));
}

function problem(status: number, code: string, detail: string): Response {
  const body = { type: 'about:blank', title: 'No', status, detail, instance: '/x', code, issues: [] };
  return new Response(JSON.stringify(body), { status, headers: { 'content-type': 'application/problem+json' } });
}

beforeEach(() => {
  asked.length = 0;
  jobs.length = 0;
  down = false;
  const Native = globalThis.Request;
  // The page's addresses are relative; outside a browser they need a place to be relative to.
  vi.stubGlobal(
    'Request',
    class extends Native {
      constructor(address: RequestInfo | URL, init?: RequestInit) {
        super(typeof address === 'string' ? new URL(address, 'http://site.test') : address, init);
      }
    },
  );
  vi.stubGlobal('fetch', serve);
});
// A busy machine works an answer out in a second or two.
configure({ asyncUtilTimeout: 8000 });

afterEach(() => {
  vi.unstubAllGlobals();
});

/** Works jobs out in the page's own thread, as the real worker does beside it. */
class WorkerHere {
  onmessage: ((event: { data: FitResult }) => void) | null = null;
  onerror: (() => void) | null = null;
  postMessage({ id, question, parts, edition }: FitJob) {
    jobs.push(question);
    setTimeout(() => this.onmessage?.({ data: { id, answer: answerFit(question, parts, { edition }) } }), 0);
  }
  terminate() {}
}

function open(address: string) {
  const router = createMemoryRouter([{ path: '/fit', Component: Fit }], { initialEntries: [address] });
  const client = createQueryClient();
  client.setDefaultOptions({ queries: { retry: false } });
  render(
    <QueryClientProvider client={client}>
      <RouterProvider router={router} />
    </QueryClientProvider>,
  );
  return router;
}
const verdict = () => within(screen.getByRole('region', { name: 'Verdict' }));

describe('the check', { timeout: 30_000 }, () => {
  it('answers the standard check: verdict, both sides, tilt in both words, what was assumed, cautions', async () => {
    open('/fit');
    expect(await verdict().findByText(/The port side is (mostly|partly) hidden by the/)).toBeInTheDocument();
    expect(screen.getByRole('heading', { level: 1 })).toHaveTextContent('Check a fit: shallow vee, 4.5 m');
    expect(screen.getByText(/nose-down 0\.5° \(heel-up 0\.5°\)/)).toBeInTheDocument();
    expect(screen.getByText(/values we assumed/)).toBeInTheDocument();
    expect(screen.getByText(/A hole below the waterline can sink a boat/)).toBeInTheDocument();
    const drawing = screen.getByRole('img', {
      name: /The boat from astern, to scale, with one motor and the sensor 380 mm to starboard\. Port: .* Starboard: clear\./,
    });
    expect(drawing.querySelector('[data-part="torpedo"]')).not.toBeNull();
  });

  it('asks again when the motor is trimmed up, and both sides come clear', async () => {
    const user = userEvent.setup();
    const router = open('/fit?motorTrimDeg=2');
    await verdict().findByText(/The port side is/);
    fireEvent.change(screen.getByRole('slider', { name: 'Motor trim while scanning, slider' }), { target: { value: '16' } });
    await user.click(screen.getByRole('button', { name: 'More: Motor trim while scanning' }));
    await waitFor(() => expect(asked.at(-1)?.lowerUnits[0]?.motorTrimDeg).toBe(17));
    expect(await verdict().findByText('Both sides look out freely.')).toBeInTheDocument();
    await waitFor(() => expect(router.state.location.search).toContain('motorTrimDeg=17'));
    await waitFor(() => expect(router.state.location.search).toContain('edition=7'));
  });

  it('refuses what it cannot read in the address, says so, and keeps the rest', async () => {
    open('/fit?offsetMm=banana&motors=none');
    expect(screen.getByText('Off centre, to starboard: “banana” is not a number; 380 mm is used.')).toBeInTheDocument();
    expect(await verdict().findByText('Both sides look out freely.')).toBeInTheDocument();
    expect(asked.at(-1)?.lowerUnits).toEqual([]);
  });

  it('says what has changed since a link was made', async () => {
    open('/fit?edition=3');
    expect(await screen.findByText(/The catalog went from edition 3 to 7\./)).toBeInTheDocument();
  });

  it('gives the cruising speed its own picture', async () => {
    open('/fit?cruiseKn=18');
    expect(await screen.findByRole('heading', { name: 'Cruising at 18\u00a0kn' })).toBeInTheDocument();
  });

  it('keeps what was set when no connection is there', async () => {
    down = true;
    const router = open('/fit?offsetMm=420');
    expect(await verdict().findByText('No connection.')).toBeInTheDocument();
    expect(screen.getByRole('textbox', { name: 'Off centre, to starboard' })).toHaveValue('420\u00a0mm');
    expect(router.state.location.search).toContain('offsetMm=420');
  });

  it('says which part the catalog does not have', async () => {
    open('/fit?hull=hul_gone');
    expect(await verdict().findByText('The catalog has no such boat.')).toBeInTheDocument();
  });

  describe('in a browser with workers', () => {
    beforeEach(() => {
      vi.stubGlobal('Worker', WorkerHere);
    });

    it('asks the server once and works changes out beside the page, whole once the hand rests', async () => {
      const router = open('/fit?motorTrimDeg=2');
      await verdict().findByText(/The port side is/);
      fireEvent.change(screen.getByRole('slider', { name: 'Motor trim while scanning, slider' }), { target: { value: '17' } });
      expect(await verdict().findByText('Both sides look out freely.')).toBeInTheDocument();
      expect(asked.map((question) => question.lowerUnits[0]?.motorTrimDeg)).toEqual([2]);
      expect(jobs.at(-1)?.uncertainty).not.toBe('none');
      await waitFor(() => expect(router.state.location.search).toContain('motorTrimDeg=17&edition=7'));
    });

    it('works out what it can on the device when no connection is there, and says so', async () => {
      down = true;
      open('/fit?motorTrimDeg=17');
      expect(await verdict().findByText(/worked out on this device/)).toBeInTheDocument();
      expect(verdict().getByText('Both sides look out freely.')).toBeInTheDocument();
      expect(verdict().queryByText('No connection.')).not.toBeInTheDocument();
    });
  });
});
