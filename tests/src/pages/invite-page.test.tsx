// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter, Route, Routes } from 'react-router-dom';
import { afterEach, expect, it, vi } from 'vitest';
import { InvitePage } from '../../../src/pages/invite-page';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

type Answers = Record<string, { status: number; body: unknown }>;

const asked = (email: string | null) => ({
  status: 200,
  body: {
    invitation: {
      team: 'Buoy preamplifier',
      role: 'reviewer',
      invitedBy: 'Ines Rautio',
      email,
      expiresAt: '2026-12-08T12:00:00.000Z',
    },
  },
});
const nobody = { status: 401, body: { error: { code: 'not-signed-in', message: 'Sign in first.' } } };
const tove = {
  status: 200,
  body: { person: { id: 'p1', name: 'Tove Bakken', email: 'tove@buoy.example' }, teams: [] },
};

function open(answers: Answers) {
  const fetched = vi.fn<typeof fetch>(async (path) => {
    const answer = answers[String(path)];
    if (answer === undefined) throw new Error(`the page asked for ${String(path)}`);
    return Response.json(answer.body, { status: answer.status });
  });
  vi.stubGlobal('fetch', fetched);
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter initialEntries={['/invite/secret-token']}>
        <Routes>
          <Route path="/invite/:token" element={<InvitePage />} />
          <Route path="/" element={<p>the sheets</p>} />
        </Routes>
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return fetched;
}

it('says why a link no longer works and offers no way to join', async () => {
  open({
    '/api/invitations/look-up': {
      status: 404,
      body: { error: { code: 'invitation-not-valid', message: 'This invitation was taken.' } },
    },
  });
  expect((await screen.findByRole('alert')).textContent).toBe('This invitation was taken.');
  expect(screen.getByText(/works once and for seven days/)).toBeTruthy();
  expect(screen.queryByRole('button')).toBeNull();
});

it('offers an account to somebody who is not signed in, and keeps the token out of every address', async () => {
  const fetched = open({ '/api/invitations/look-up': asked('ola@buoy.example'), '/api/me': nobody });
  const email = await screen.findByLabelText('E-mail address');
  expect(email).toHaveProperty('value', 'ola@buoy.example');
  expect(email).toHaveProperty('readOnly', true);
  expect(fetched.mock.calls.map(([path]) => String(path)).filter((path) => path.includes('secret-token'))).toEqual([]);
});

it('lets a signed-in person join with one press', async () => {
  open({
    '/api/invitations/look-up': asked(null),
    '/api/me': tove,
    '/api/invitations/accept': {
      status: 200,
      body: { team: { id: 't1', name: 'Buoy preamplifier', role: 'reviewer' } },
    },
  });
  await userEvent.setup().click(await screen.findByRole('button', { name: 'Join as Tove Bakken' }));
  expect(await screen.findByText('the sheets')).toBeTruthy();
});

it('tells somebody who is signed in as another than the one asked', async () => {
  open({ '/api/invitations/look-up': asked('ola@buoy.example'), '/api/me': tove });
  expect(
    await screen.findByText(/It is for ola@buoy.example, but you are signed in as tove@buoy.example/),
  ).toBeTruthy();
  expect(screen.queryByRole('button', { name: /Join/ })).toBeNull();
});
