import { afterEach, beforeEach, expect, vi, type MockInstance } from 'vitest';

// An error on the console that no test asked for is a defect that nobody would see.
let spy: MockInstance;
beforeEach(() => {
  spy = vi.spyOn(console, 'error');
});
afterEach(() => {
  const calls = spy.mock.calls.map((call) => call.map(String).join(' '));
  spy.mockRestore();
  expect(calls, 'unexpected console.error').toEqual([]);
});
