// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { AccountForm } from '@/components/account/AccountForm';
import { registerSchema } from '@/components/account/account-schemas';
import { EMAIL, NAME, NEW_PASSWORD } from '@/components/account/fields';
import { Refusal } from '@/components/api';

afterEach(cleanup);

type Send = (values: { name: string; email: string; password: string }) => Promise<unknown>;

function shown(send: Send) {
  const initial = { name: '', email: '', password: '' };
  return render(
    <AccountForm
      schema={registerSchema}
      fields={[NAME, EMAIL, NEW_PASSWORD]}
      initial={initial}
      button="Open account"
      send={send}
      done="Opened."
    />,
  );
}
const type = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
function fill() {
  type('Name', 'Ines');
  type('E-mail address', 'ines@farrow.example');
  type('Password', 'rye-and-ember');
}
const press = () => fireEvent.click(screen.getByRole('button', { name: 'Open account' }));

describe('AccountForm', () => {
  test('an entry that does not fit is marked in plain words and nothing is sent', async () => {
    const send = vi.fn();
    shown(send);
    type('E-mail address', 'ines');
    press();
    expect(await screen.findByText('Say a name.')).toBeTruthy();
    expect(screen.getByText('Write an address such as name@example.org.')).toBeTruthy();
    expect(
      screen.getByText(/at least 10 characters; a short sentence works well\.$/, {
        selector: '.field-wrong',
      }),
    ).toBeTruthy();
    expect(screen.getByLabelText('E-mail address').getAttribute('aria-invalid')).toBe('true');
    expect(send).not.toHaveBeenCalled();
  });

  test('what fits is sent, and it says that it is done', async () => {
    const send = vi.fn(async () => undefined);
    shown(send);
    fill();
    press();
    expect(await screen.findByText('Opened.')).toBeTruthy();
    expect(send).toHaveBeenCalledWith({
      name: 'Ines',
      email: 'ines@farrow.example',
      password: 'rye-and-ember',
    });
  });

  test('a refusal says what, why and what to do, marks its field, and keeps what was typed', async () => {
    const problem = {
      code: 'malformed',
      title: 'Something does not fit.',
      detail: 'The marked field.',
      action: 'Correct it.',
      fields: { email: 'This address bounces.' },
    };
    shown(async () => Promise.reject(new Refusal(422, problem)));
    fill();
    press();
    const alert = await screen.findByRole('alert');
    expect(alert.textContent).toContain('Something does not fit. The marked field. Correct it.');
    expect(screen.getByText('This address bounces.')).toBeTruthy();
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('Ines');
    expect(screen.queryByText('Opened.')).toBeNull();
  });

  test('a connection that is down is put into words', async () => {
    shown(async () => Promise.reject(new TypeError('failed to fetch')));
    fill();
    press();
    await waitFor(() => expect(screen.getByRole('alert').textContent).toContain('The shop does not answer.'));
  });

  test('should the browser send the form itself, it posts', () => {
    const { container } = shown(vi.fn());
    expect(container.querySelector('form')?.method).toBe('post');
  });
});
