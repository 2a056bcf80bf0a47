// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { picturesOf } from '../../../src/components/viewer/pictures';
import { Viewer } from '../../../src/components/viewer/Viewer';
import { findings, preparation } from '../order-fixtures';

beforeEach(() => {
  vi.stubGlobal('matchMedia', () => ({
    matches: false,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      disconnect() {}
    },
  );
  vi.spyOn(HTMLElement.prototype, 'clientWidth', 'get').mockReturnValue(832);
  vi.spyOn(HTMLElement.prototype, 'clientHeight', 'get').mockReturnValue(432);
  vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null);
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

const open = () =>
  render(
    <Viewer
      pictures={picturesOf(preparation, null)}
      widthMm={90}
      heightMm={60}
      pitchMm={0.11}
      findings={findings}
      resultKey="a"
    />,
  );
const plate = () => screen.getByRole('application');
const ruleText = () => document.querySelector('.rule')?.textContent ?? '';
const pressed = () =>
  screen.getAllByRole('button', { pressed: true }).map((b) => b.getAttribute('aria-label') ?? '');

describe('Viewer', () => {
  it('compares what was sent with the last picture, and any two that are chosen', () => {
    open();
    expect(plate().getAttribute('aria-label')).toMatch(/^Sent and Burned\./);
    fireEvent.click(screen.getByRole('button', { name: /^Toned/ }));
    expect(plate().getAttribute('aria-label')).toMatch(/^Toned and Burned\./);
    expect(pressed().filter((name) => /^(Toned|Burned)/.test(name))).toHaveLength(2);
  });

  it('zooms and pans by keys, and the rule follows', () => {
    open();
    expect(ruleText()).toContain('a tick per ten');
    for (let i = 0; i < 8; i += 1) fireEvent.keyDown(plate(), { key: '+' });
    expect(ruleText()).toContain('each one drawn');
    const before = ruleText();
    fireEvent.keyDown(plate(), { key: 'ArrowRight', shiftKey: true });
    expect(ruleText()).not.toBe(before);
    fireEvent.keyDown(plate(), { key: '0' });
    expect(ruleText()).toContain('a tick per ten');
  });

  it('shows the other picture while space is held', () => {
    open();
    expect(screen.getByRole('slider', { name: 'Sweep from Sent to Burned' })).toBeTruthy();
    fireEvent.keyDown(plate(), { key: ' ' });
    expect(screen.queryByRole('slider', { name: /Sweep/ })).toBeNull();
    fireEvent.keyUp(plate(), { key: ' ' });
    expect(screen.getByRole('slider', { name: /Sweep/ })).toBeTruthy();
  });

  it('moves the sweep with the arrow keys of its own handle', () => {
    open();
    const handle = screen.getByRole('slider', { name: /Sweep/ });
    fireEvent.keyDown(handle, { key: 'ArrowRight' });
    expect(handle.getAttribute('aria-valuenow')).toBe('52');
    fireEvent.keyDown(handle, { key: 'Home' });
    expect(handle.getAttribute('aria-valuenow')).toBe('0');
  });

  it('goes through the findings with f and lights note and place together', () => {
    open();
    const lit = () =>
      [...document.querySelectorAll('.note[data-lit="true"]')].map((n) => n.textContent ?? '');
    fireEvent.keyDown(plate(), { key: 'f' });
    expect(lit()).toHaveLength(1);
    expect(lit()[0]).toContain('Hairlines');
    expect(ruleText()).toContain('each one drawn');
    fireEvent.keyDown(plate(), { key: 'f' });
    expect(lit()[0]).toContain('Gaps that close up');
  });
});
