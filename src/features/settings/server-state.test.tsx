import { render, screen } from '@testing-library/react';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { ServerData } from '#src/components/server-data.tsx';
import { queryClient } from '#src/lib/query-client.ts';
import { ServerState } from './server-state.tsx';

beforeEach(() => {
  queryClient.clear();
  queryClient.setDefaultOptions({ queries: { retry: false } });
});
afterEach(() => vi.unstubAllGlobals());

function show(answer: () => Promise<Response>) {
  vi.stubGlobal('fetch', vi.fn(answer));
  render(
    <ServerData>
      <ServerState />
    </ServerData>,
  );
}

const json = (body: unknown, status = 200) => Promise.resolve(new Response(JSON.stringify(body), { status }));

it('says that server and database answer', async () => {
  show(() => json({ status: 'ok', database: 'answers', engineVersion: 1 }));
  expect(await screen.findByText(/its database answers\./)).toBeTruthy();
});

it('says that the database does not answer, and when the engines differ', async () => {
  show(() => json({ status: 'degraded', database: 'does not answer', engineVersion: 9 }, 503));
  expect(await screen.findByText(/database does not answer\. It computes with engine version 9: reload the page\./)).toBeTruthy();
});

it('says that the bench works without a server', async () => {
  show(() => Promise.reject(new TypeError('no network')));
  expect(await screen.findByText(/The server does not answer\. The bench works without it/)).toBeTruthy();
});

it('does not show an answer it cannot read', async () => {
  show(() => json({ status: 'fine' }));
  expect(await screen.findByText(/in a form that this page does not know/)).toBeTruthy();
});
