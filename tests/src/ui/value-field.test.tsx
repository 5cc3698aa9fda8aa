// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, test, vi } from 'vitest';
import { ValueField } from '../../../src/ui/value-field';

afterEach(cleanup);

type Refusal = { ok: false; reason: string } | undefined;

const readWhole = (text: string) =>
  /^\d+$/.test(text) ? { ok: true as const, value: Number(text) } : { ok: false as const, reason: 'Type digits.' };

function setUp(onCommit: (value: number) => Refusal = () => undefined) {
  const commit = vi.fn(onCommit);
  const element = (value: number) => (
    <>
      <ValueField label="count" value={value} show={String} read={readWhole} onCommit={commit} />
      <button type="button">elsewhere</button>
    </>
  );
  const { rerender } = render(element(2));
  return {
    commit,
    field: screen.getByLabelText<HTMLInputElement>('count'),
    user: userEvent.setup(),
    changeElsewhere: (value: number) => rerender(element(value)),
  };
}

test('Enter commits what was read, once, and an unchanged field commits nothing', async () => {
  const { commit, field, user } = setUp();
  await user.click(field);
  await user.keyboard('{Enter}');
  expect(commit).not.toHaveBeenCalled();
  await user.clear(field);
  await user.type(field, '7{Enter}');
  await user.tab();
  expect(commit.mock.calls).toEqual([[7]]);
});

test('leaving the field commits', async () => {
  const { commit, field, user } = setUp();
  await user.clear(field);
  await user.type(field, '12');
  await user.click(screen.getByRole('button'));
  expect(commit.mock.calls).toEqual([[12]]);
});

test('Escape takes the typing back and keeps the key to itself, an idle field lets it through', async () => {
  const { commit, field, user } = setUp();
  const outside = vi.fn();
  document.addEventListener('keydown', outside);
  await user.clear(field);
  await user.type(field, '99');
  outside.mockClear();
  await user.keyboard('{Escape}');
  expect(field.value).toBe('2');
  expect(commit).not.toHaveBeenCalled();
  expect(outside).not.toHaveBeenCalled();
  await user.keyboard('{Escape}');
  expect(outside).toHaveBeenCalledOnce();
  document.removeEventListener('keydown', outside);
});

test('text that cannot be read stays, with the reason tied to the field, until it can be read', async () => {
  const { commit, field, user } = setUp();
  await user.clear(field);
  await user.type(field, 'many{Enter}');
  await user.tab();
  expect(field.value).toBe('many');
  expect(field.getAttribute('aria-invalid')).toBe('true');
  expect(document.getElementById(field.getAttribute('aria-describedby') ?? '')?.textContent).toBe('Type digits.');
  expect(commit).not.toHaveBeenCalled();
  await user.clear(field);
  await user.type(field, '3');
  expect(field.getAttribute('aria-invalid')).toBe('false');
  await user.keyboard('{Enter}');
  expect(commit.mock.calls).toEqual([[3]]);
});

test('a value that is refused stays in the field with the reason', async () => {
  const { field, user } = setUp(() => ({ ok: false, reason: 'That one is taken.' }));
  await user.clear(field);
  await user.type(field, '4{Enter}');
  expect(field.value).toBe('4');
  expect(screen.getByRole('alert').textContent).toBe('That one is taken.');
});

test('a change from elsewhere shows at once, but never under the hands of the person typing', async () => {
  const { field, user, changeElsewhere } = setUp();
  changeElsewhere(5);
  expect(field.value).toBe('5');
  await user.clear(field);
  await user.type(field, '8');
  changeElsewhere(6);
  expect(field.value).toBe('8');
  await user.keyboard('{Escape}');
  expect(field.value).toBe('6');
});
