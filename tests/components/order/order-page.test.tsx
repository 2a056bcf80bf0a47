// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import OrderPage from '@/components/order/OrderPage';
import type { OrderView } from '@/lib/orders/views';
import { orderView } from '../order-fixtures';
import { stubBrowser } from '../stub-browser';

const sha = 'a'.repeat(64);
const passed = { by: 'Ines Okafor', at: '2026-11-30T10:00:00.000Z', manifestSha256: sha };
const proofSent = (changes: Partial<OrderView> = {}) =>
  orderView({
    state: 'proof-sent',
    passed,
    events: ['approve', 'ask-for-changes', 'new-artwork', 'cancel'],
    ...changes,
  });

let sent: { address: string; body: unknown }[];
let answers: (body: { event?: string }) => Response;

beforeEach(() => {
  sent = [];
  vi.stubGlobal('fetch', async (address: string, init: RequestInit = {}) => {
    const body = init.body ? JSON.parse(String(init.body)) : {};
    if (init.method === 'POST') sent.push({ address, body });
    return answers(body);
  });
  stubBrowser();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});
const json = (body: unknown, status = 200) => new Response(JSON.stringify(body), { status });

describe('OrderPage for a customer', () => {
  test('a proof shows the forecast, the sentence and one decision', () => {
    answers = () => json({ order: proofSent() });
    render(<OrderPage initial={proofSent()} role="customer" />);
    const proof = screen.getByRole('region', { name: 'Proof' });
    expect(
      within(proof)
        .getByAltText(/^Burn forecast of/)
        .getAttribute('src'),
    ).toBe('/api/orders/U-1004/preparations/31/pictures/burned');
    expect(proof.textContent).toContain(
      'Engraved as halftone, 90 × 60 mm, on Birch plywood 4 mm, shade Umber, L* 38.',
    );
    expect(within(proof).getByRole('button', { name: 'Approve proof' })).toBeTruthy();
    expect(screen.getByText('Proof sent', { selector: '[aria-current="step"] *' })).toBeTruthy();
  });

  test('approval names the very manifest that is shown, and the version that was seen', async () => {
    const approved = {
      by: 'Maren Holt',
      at: '2026-12-01T09:00:00.000Z',
      manifestSha256: sha,
      how: 'on the order page',
    };
    answers = () => json({ order: proofSent({ state: 'approved', version: 13, approved, events: [] }) });
    render(<OrderPage initial={proofSent()} role="customer" />);
    fireEvent.click(screen.getByRole('button', { name: 'Approve proof' }));
    expect(await screen.findByText(/Approved by Maren Holt/)).toBeTruthy();
    expect(sent).toEqual([
      {
        address: '/api/orders/U-1004/events',
        body: { event: 'approve', manifestSha256: sha, inPerson: null, version: 12 },
      },
    ]);
    expect(screen.queryByRole('button', { name: 'Approve proof' })).toBeNull();
  });

  test('a proof that changed meanwhile is not approved, and it says what to do', async () => {
    const problem = {
      code: 'not-now',
      title: 'That cannot happen now.',
      detail: 'The proof has changed since this page was opened.',
      action: 'Look at the new one.',
    };
    answers = (body) => (body.event ? json(problem, 409) : json({ order: proofSent({ version: 14 }) }));
    render(<OrderPage initial={proofSent()} role="customer" />);
    fireEvent.click(screen.getByRole('button', { name: 'Approve proof' }));
    expect((await screen.findByRole('alert')).textContent).toContain(
      'The proof has changed since this page was opened. Look at the new one.',
    );
  });

  test('changes are asked for in words', async () => {
    answers = () =>
      json({ order: proofSent({ state: 'in-preparation', version: 13, passed: null, events: [] }) });
    render(<OrderPage initial={proofSent()} role="customer" />);
    fireEvent.click(screen.getByRole('button', { name: 'Ask for changes' }));
    fireEvent.click(screen.getByRole('button', { name: 'Send to the shop' }));
    expect(await screen.findByText(/Say it in a few words/)).toBeTruthy();
    fireEvent.change(screen.getByLabelText('What should be different'), {
      target: { value: 'Larger by a third' },
    });
    fireEvent.click(screen.getByRole('button', { name: 'Send to the shop' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0].body).toEqual({ event: 'ask-for-changes', words: 'Larger by a third', version: 12 });
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  });

  test('before the proof the artwork stands on the plate with its findings', () => {
    answers = () => json({ order: orderView() });
    render(<OrderPage initial={orderView()} role="customer" />);
    expect(screen.queryByRole('region', { name: 'Proof' })).toBeNull();
    expect(screen.getByText('Hairlines')).toBeTruthy();
    expect(screen.getByRole('link', { name: 'harbour-2.png' }).getAttribute('href')).toBe(
      '/api/orders/U-1004/artwork/2/original',
    );
  });

  test('an order on hold says why, and where it stood', () => {
    const held = orderView({
      state: 'on-hold',
      heldBecause: 'The material is not identified yet.',
      history: [
        {
          at: '2026-11-28T08:00:00.000Z',
          by: 'Ines Okafor',
          event: 'hold',
          from: 'submitted',
          to: 'on-hold',
          words: '',
        },
      ],
      events: [],
    });
    answers = () => json({ order: held });
    render(<OrderPage initial={held} role="customer" />);
    expect(screen.getByRole('alert').textContent).toContain('The material is not identified yet.');
    expect(screen.getByText(/, after: submitted/)).toBeTruthy();
  });
});

test('staff are led to where they work, and never see the customer’s decision', () => {
  answers = () => json({ order: proofSent() });
  render(<OrderPage initial={proofSent()} role="designer" />);
  expect(screen.getByRole('link', { name: 'Open in the queue' }).getAttribute('href')).toBe('/queue/U-1004');
  expect(screen.queryByRole('button', { name: 'Approve proof' })).toBeNull();
});
