// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { act, cleanup, renderHook, waitFor } from '@testing-library/react';
import type { ReactNode } from 'react';
import { useForm } from 'react-hook-form';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { EMPTY_FORM, patchOf, type DraftForm } from '@/components/new-order/draft-form';
import { useDraft } from '@/components/new-order/use-draft';
import { orderFieldsSchema } from '@/lib/orders/order';
import type { OrderView } from '@/lib/orders/views';

/** A server of one draft: counts versions, refuses a version that is not the newest. */
function shopOfOneDraft() {
  let fields = orderFieldsSchema.parse(patchOf(EMPTY_FORM));
  let version = 1;
  const sent: { method: string; body: { version?: number; fields?: object } }[] = [];
  const view = () => ({ order: { number: 'U-1001', version, fields } as OrderView });
  const answer = (status: number, body: unknown) => new Response(JSON.stringify(body), { status });
  vi.stubGlobal('fetch', async (_address: string, init: RequestInit) => {
    const body = init.body ? JSON.parse(String(init.body)) : {};
    sent.push({ method: init.method ?? '', body });
    if (init.method === 'GET') return answer(200, view());
    if (init.method === 'PATCH' && body.version !== version) {
      return answer(409, { code: 'conflict', title: 'This changed meanwhile.', detail: '', action: '' });
    }
    fields = { ...fields, ...(init.method === 'PATCH' ? body.fields : body) };
    version += 1;
    return answer(200, view());
  });
  return { sent, elsewhere: () => (version += 1), fields: () => fields };
}

function draftOf() {
  const client = new QueryClient();
  const wrapper = ({ children }: { children: ReactNode }) => (
    <QueryClientProvider client={client}>{children}</QueryClientProvider>
  );
  return renderHook(
    () => {
      const form = useForm<DraftForm>({ defaultValues: EMPTY_FORM });
      return { form, draft: useDraft(form, null, null) };
    },
    { wrapper },
  ).result;
}

beforeEach(() => vi.useFakeTimers({ shouldAdvanceTime: true }));
afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

describe('useDraft', () => {
  test('nothing is opened before something is said', async () => {
    const shop = shopOfOneDraft();
    draftOf();
    await act(() => vi.advanceTimersByTimeAsync(2000));
    expect(shop.sent).toEqual([]);
  });

  test('the first field opens the draft, later ones change it with the version last seen', async () => {
    const shop = shopOfOneDraft();
    const result = draftOf();
    act(() => result.current.form.setValue('title', 'Fern'));
    await waitFor(() => expect(result.current.draft.order?.number).toBe('U-1001'));
    act(() => result.current.form.setValue('quantity', 3));
    await waitFor(() => expect(shop.fields().quantity).toBe(3));
    expect(shop.sent.map(({ method }) => method)).toEqual(['POST', 'PATCH']);
    expect(shop.sent[1].body).toEqual({ version: 2, fields: { quantity: 3 } });
    expect(window.location.search).toBe('?draft=U-1001');
  });

  test('quick typing is kept once', async () => {
    const shop = shopOfOneDraft();
    const result = draftOf();
    for (const title of ['F', 'Fe', 'Fer', 'Fern']) act(() => result.current.form.setValue('title', title));
    await waitFor(() => expect(shop.fields().title).toBe('Fern'));
    expect(shop.sent).toHaveLength(1);
  });

  test('when something else was faster, the change goes again with the new version', async () => {
    const shop = shopOfOneDraft();
    const result = draftOf();
    await act(() => result.current.draft.open());
    shop.elsewhere();
    act(() => result.current.form.setValue('title', 'Fern'));
    await waitFor(() => expect(shop.fields().title).toBe('Fern'));
    expect(shop.sent.map(({ method }) => method)).toEqual(['POST', 'PATCH', 'GET', 'PATCH']);
    expect(result.current.draft.keeping).toBe('kept');
  });

  test('what cannot be kept says so, and what was typed stays', async () => {
    vi.stubGlobal('fetch', async () => Promise.reject(new TypeError('failed to fetch')));
    const result = draftOf();
    act(() => result.current.form.setValue('title', 'Fern'));
    await waitFor(() => expect(result.current.draft.keeping).toBe('not-kept'));
    expect(result.current.draft.problem?.title).toBe('The shop does not answer.');
    expect(result.current.form.getValues('title')).toBe('Fern');
  });
});
