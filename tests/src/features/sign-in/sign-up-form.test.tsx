// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, it, vi } from 'vitest';
import { SignUpForm } from '../../../../src/features/sign-in/sign-up-form';

afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function show(answer: { status: number; body: unknown }) {
  const fetched = vi.fn<typeof fetch>(async () => Response.json(answer.body, { status: answer.status }));
  vi.stubGlobal('fetch', fetched);
  const signedUp = vi.fn();
  render(
    <QueryClientProvider client={new QueryClient()}>
      <SignUpForm onSignedUp={signedUp} />
    </QueryClientProvider>,
  );
  return { fetched, signedUp, person: userEvent.setup() };
}

async function fillIn(person: ReturnType<typeof userEvent.setup>, email: string) {
  await person.type(screen.getByLabelText('Name'), 'Ola Nord');
  await person.type(screen.getByLabelText('E-mail address'), email);
  await person.type(screen.getByLabelText('Password'), 'four drifting buoys');
  await person.click(screen.getByRole('button', { name: 'Make the account' }));
}

it('puts what the server says of a field beside that field, and the focus in it', async () => {
  const message = 'There is an account with this address: sign in instead.';
  const { signedUp, person } = show({
    status: 409,
    body: { error: { code: 'address-taken', message, fields: { email: message } } },
  });
  await fillIn(person, 'ola@buoy.example');
  const email = screen.getByLabelText('E-mail address');
  await waitFor(() => expect(email.getAttribute('aria-invalid')).toBe('true'));
  expect(document.getElementById(email.getAttribute('aria-describedby') ?? '')?.textContent).toBe(message);
  expect(document.activeElement).toBe(email);
  expect(screen.queryByRole('alert')).toBeNull();
  expect(signedUp).not.toHaveBeenCalled();
});

it('says of the whole form what belongs to no field', async () => {
  const { person } = show({
    status: 429,
    body: { error: { code: 'too-many', message: 'Too many tries: wait a minute.' } },
  });
  await fillIn(person, 'ola@buoy.example');
  expect((await screen.findByRole('alert')).textContent).toBe('Too many tries: wait a minute.');
});

it('sends nothing that the shared schema refuses', async () => {
  const { fetched, person } = show({ status: 201, body: {} });
  await fillIn(person, 'ola');
  await screen.findByText('This is not an e-mail address.');
  expect(fetched).not.toHaveBeenCalled();
});
