import { act, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter, useLocation, useNavigate } from 'react-router';
import { expect, test } from 'vitest';
import { useTextInAddress } from './use-text-in-address.ts';

function Field() {
  const [text, setText] = useTextInAddress('q', 20);
  const navigate = useNavigate();
  return (
    <>
      <input aria-label="name" value={text} onChange={(event) => setText(event.target.value)} />
      <output>{useLocation().search}</output>
      <button type="button" onClick={() => void navigate('/')}>
        home
      </button>
    </>
  );
}

const show = (at: string) =>
  render(
    <MemoryRouter initialEntries={[at]}>
      <Field />
    </MemoryRouter>,
  );
const settle = () => act(() => new Promise((resolve) => setTimeout(resolve, 80)));

test('every key of a fast typist stands, and the address follows when typing rests', async () => {
  show('/');
  const user = userEvent.setup({ delay: null });
  await user.type(screen.getByLabelText('name'), 'copperplate 670');
  expect(screen.getByLabelText('name')).toHaveProperty('value', 'copperplate 670');
  await settle();
  expect(screen.getByRole('status').textContent).toBe('?q=copperplate+670');
  await user.clear(screen.getByLabelText('name'));
  await settle();
  expect(screen.getByRole('status').textContent).toBe('');
});

test('an address with words fills the field, and going home empties it', async () => {
  show('/?q=reedcutter');
  expect(screen.getByLabelText('name')).toHaveProperty('value', 'reedcutter');
  await userEvent.click(screen.getByRole('button', { name: 'home' }));
  await settle();
  expect(screen.getByLabelText('name')).toHaveProperty('value', '');
  expect(screen.getByRole('status').textContent).toBe('');
});
