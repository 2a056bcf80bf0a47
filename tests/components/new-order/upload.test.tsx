// @vitest-environment jsdom
import { act, cleanup, fireEvent, renderHook, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import type { Draft } from '@/components/new-order/use-draft';
import { useFileArrival } from '@/components/new-order/use-file-arrival';
import { useUpload } from '@/components/new-order/use-upload';
import type { OrderView } from '@/lib/orders/views';

/** The part of XMLHttpRequest that an upload uses, driven by the test. */
class FakeRequest {
  static last: FakeRequest;
  upload: { onprogress?: (event: { lengthComputable: boolean; loaded: number; total: number }) => void } = {};
  onload?: () => void;
  onerror?: () => void;
  onabort?: () => void;
  status = 0;
  response: unknown = null;
  responseType = '';
  address = '';
  constructor() {
    FakeRequest.last = this;
  }
  open(_method: string, address: string) {
    this.address = address;
  }
  send = vi.fn();
  abort() {
    this.onabort?.();
  }
  answer(status: number, response: unknown) {
    this.status = status;
    this.response = response;
    this.onload?.();
  }
}

const order = { number: 'U-1001', version: 2 } as OrderView;
const file = (name: string, bytes = 10) => new File([new Uint8Array(bytes)], name);

beforeEach(() => {
  vi.stubGlobal('XMLHttpRequest', FakeRequest);
  Object.assign(URL, { createObjectURL: () => 'blob:preview', revokeObjectURL: () => undefined });
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function uploadOf() {
  const take = vi.fn();
  const open = vi.fn(async () => order);
  const { result } = renderHook(() => useUpload({ open, take } as unknown as Draft));
  return { result, take, open };
}

describe('useUpload', () => {
  test('opens the draft, tells how far it is, and hands over the order', async () => {
    const { result, take, open } = uploadOf();
    act(() => result.current.start(file('fern.svg')));
    expect(result.current.progress).toBe(0);
    await waitFor(() => expect(FakeRequest.last?.send).toHaveBeenCalled());
    expect(open).toHaveBeenCalledOnce();
    expect(FakeRequest.last.address).toBe('/api/orders/U-1001/artwork');
    act(() => FakeRequest.last.upload.onprogress?.({ lengthComputable: true, loaded: 3, total: 10 }));
    expect(result.current.progress).toBeCloseTo(0.3);
    act(() => FakeRequest.last.answer(200, { order }));
    await waitFor(() => expect(take).toHaveBeenCalledWith(order));
    await waitFor(() => expect(result.current.progress).toBeNull());
    expect(result.current.previewUrl).toBe('blob:preview');
  });

  test('cancelled, it stops without a complaint', async () => {
    const { result, take } = uploadOf();
    act(() => result.current.start(file('fern.svg')));
    await waitFor(() => expect(FakeRequest.last.send).toHaveBeenCalled());
    act(() => result.current.cancel());
    await waitFor(() => expect(result.current.progress).toBeNull());
    expect(result.current.problem).toBeNull();
    expect(take).not.toHaveBeenCalled();
  });

  test('cancelled while the draft is still being opened, nothing is sent', async () => {
    const { result } = uploadOf();
    const before = FakeRequest.last;
    act(() => result.current.start(file('fern.svg')));
    act(() => result.current.cancel());
    await waitFor(() => expect(result.current.progress).toBeNull());
    expect(FakeRequest.last).toBe(before);
  });

  test('refused by the server, it says so in the server’s words', async () => {
    const { result } = uploadOf();
    const problem = {
      code: 'artwork-refused',
      title: 'This file cannot be used.',
      detail: 'It stops half-way.',
      action: 'Export it again.',
    };
    act(() => result.current.start(file('half.png')));
    await waitFor(() => expect(FakeRequest.last.send).toHaveBeenCalled());
    act(() => FakeRequest.last.answer(422, problem));
    await waitFor(() => expect(result.current.problem).toEqual(problem));
  });

  test('a connection that breaks off says what to do', async () => {
    const { result } = uploadOf();
    act(() => result.current.start(file('fern.svg')));
    await waitFor(() => expect(FakeRequest.last.send).toHaveBeenCalled());
    act(() => FakeRequest.last.onerror?.());
    await waitFor(() => expect(result.current.problem?.action).toBe('Drop the file here again.'));
  });

  test('what can be refused at once opens no draft', () => {
    const { result, open } = uploadOf();
    act(() => result.current.start(file('plan.pdf')));
    expect(result.current.problem?.title).toBe('A PDF file cannot be engraved as it is.');
    expect(open).not.toHaveBeenCalled();
    expect(result.current.progress).toBeNull();
  });
});

describe('useFileArrival', () => {
  const carrying = (files: File[]) => ({ dataTransfer: { types: ['Files'], files } });

  test('a file dropped anywhere on the page arrives, and the page says that it may be let go', () => {
    const arrived = vi.fn();
    const { result } = renderHook(() => useFileArrival(arrived));
    fireEvent.dragEnter(document.body, carrying([]));
    expect(result.current).toBe(true);
    const fern = file('fern.svg');
    fireEvent.drop(document.body, carrying([fern]));
    expect(arrived).toHaveBeenCalledWith(fern);
    expect(result.current).toBe(false);
  });

  test('text that is dragged is left to the browser', () => {
    const arrived = vi.fn();
    const { result } = renderHook(() => useFileArrival(arrived));
    fireEvent.dragEnter(document.body, { dataTransfer: { types: ['text/plain'], files: [] } });
    fireEvent.drop(document.body, { dataTransfer: { types: ['text/plain'], files: [] } });
    expect(result.current).toBe(false);
    expect(arrived).not.toHaveBeenCalled();
  });

  test('a picture that is pasted arrives; pasted text stays where it was pasted', () => {
    const arrived = vi.fn();
    renderHook(() => useFileArrival(arrived));
    const picture = file('image.png');
    fireEvent.paste(document.body, { clipboardData: { files: [picture] } });
    fireEvent.paste(document.body, { clipboardData: { files: [] } });
    expect(arrived).toHaveBeenCalledTimes(1);
    expect(arrived).toHaveBeenCalledWith(picture);
  });
});
