// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { qrDrawing } from '@/components/ticket/qr-path';
import { Ticket } from '@/components/ticket/Ticket';
import type { OrderView } from '@/lib/orders/views';
import { orderView } from '../order-fixtures';
import { stubBrowser } from '../stub-browser';

const sha = 'a'.repeat(64);
const proofSent = orderView({
  state: 'proof-sent',
  passed: { by: 'Ines Okafor', at: '2026-11-30T10:00:00.000Z', manifestSha256: sha },
  events: ['approve', 'ask-for-changes', 'hold', 'cancel'],
});
const json = (body: unknown, status = 200) => new Response(JSON.stringify(body), { status });

let sent: unknown[];
function openTicket(order: OrderView): void {
  vi.stubGlobal('fetch', async (address: string, init: RequestInit = {}) => {
    if (address.endsWith('/machines')) return json({ machines: [] });
    if (address.endsWith('/ticket')) return json({ code: 'order-waits', title: 'Not yet.' }, 409);
    if (init.method === 'POST') {
      sent.push(JSON.parse(String(init.body)));
      return json({ order: orderView({ state: 'approved', version: 13, events: ['hold', 'cancel'] }) });
    }
    return json({ order });
  });
  render(<Ticket number="U-1004" paper="a4" qr={qrDrawing('https://shop.example/tickets/U-1004')} />);
}

beforeEach(() => {
  sent = [];
  stubBrowser();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

it('records an approval given in person: who gave it, how, and of which manifest', async () => {
  openTicket(proofSent);
  fireEvent.click(await screen.findByRole('button', { name: 'Record an approval in person' }));
  const dialog = within(await screen.findByRole('dialog'));
  fireEvent.click(dialog.getByRole('button', { name: 'Record an approval in person' }));
  expect(await dialog.findAllByText('Fill this in.')).toHaveLength(2);
  fireEvent.change(dialog.getByLabelText('Who gave it'), { target: { value: 'Maren Holt' } });
  fireEvent.change(dialog.getByLabelText('How it was given'), { target: { value: 'at the counter' } });
  fireEvent.click(dialog.getByRole('button', { name: 'Record an approval in person' }));
  await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
  expect(sent).toEqual([
    {
      event: 'approve',
      manifestSha256: sha,
      inPerson: { who: 'Maren Holt', how: 'at the counter' },
      version: 12,
    },
  ]);
  expect(screen.queryByRole('button', { name: 'Record an approval in person' })).toBeNull();
});

it('offers nothing to approve where no proof was sent', async () => {
  openTicket(orderView({ state: 'released', events: ['on-the-machine', 'hold', 'cancel'] }));
  await screen.findByRole('button', { name: 'On the machine' });
  expect(screen.queryByRole('button', { name: /approval|changes/ })).toBeNull();
});
