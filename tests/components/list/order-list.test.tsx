// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { OrderList } from '../../../src/components/list/OrderList';
import { machine, orderRow } from '../order-fixtures';

const OWN = { state: 'in-preparation' } as const;
const FILTERS = [
  { id: 'in-preparation', name: 'In preparation' },
  { id: '', name: 'All orders' },
];
const asked: URL[] = [];

function answer(rows: unknown[], total: number) {
  vi.stubGlobal('fetch', (input: string) => {
    const url = new URL(input, 'http://localhost');
    if (url.pathname === '/api/orders') asked.push(url);
    const body =
      url.pathname === '/api/machines'
        ? { machines: [machine] }
        : { rows, total, page: Number(url.searchParams.get('page') ?? 1), perPage: 25 };
    return Promise.resolve(new Response(JSON.stringify(body), { status: 200 }));
  });
}

function open(search = '') {
  window.history.replaceState(null, '', `/queue${search}`);
  return render(
    <OrderList
      initialSearch={search}
      today="2026-12-01"
      own={OWN}
      filters={FILTERS}
      columns={['number', 'title', 'customer', 'due']}
      hrefBase="/queue"
      empty="No order waits."
    />,
  );
}

beforeEach(() => {
  asked.length = 0;
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

describe('OrderList', () => {
  it('asks for what the address says and writes a sorted column into it', async () => {
    answer([orderRow()], 60);
    open('?q=harbour&page=2');
    await screen.findAllByText('U-1004');
    expect(asked[0].searchParams.get('q')).toBe('harbour');
    expect(asked[0].searchParams.get('page')).toBe('2');
    fireEvent.click(screen.getByRole('button', { name: 'Customer' }));
    await waitFor(() => expect(window.location.search).toBe('?q=harbour&sort=customer'));
    await waitFor(() => expect(asked.at(-1)?.searchParams.get('sort')).toBe('customer'));
    expect(screen.getByRole('columnheader', { name: 'Customer' }).getAttribute('aria-sort')).toBe(
      'ascending',
    );
  });
  it('goes back with the browser', async () => {
    answer([orderRow()], 60);
    open();
    await screen.findAllByText('U-1004');
    fireEvent.click(screen.getByRole('button', { name: 'Next page' }));
    await waitFor(() => expect(window.location.search).toBe('?page=2'));
    window.history.replaceState(null, '', '/queue');
    fireEvent(window, new PopStateEvent('popstate'));
    await screen.findByText('1 to 25 of 60');
    expect(screen.getByText(/^Page 1 of 3$/)).toBeTruthy();
  });
  it('says that a search found nothing, and that a list is empty', async () => {
    answer([], 0);
    open('?q=zebra');
    await screen.findByText('No order fits this search.');
    fireEvent.click(screen.getByRole('button', { name: 'Show all of the list' }));
    await screen.findByText('No order waits.');
    expect(window.location.search).toBe('');
  });
});
