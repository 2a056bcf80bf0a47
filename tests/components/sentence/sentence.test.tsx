// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { useState } from 'react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { choiceContext } from '../../../src/components/sentence/context';
import { Sentence } from '../../../src/components/sentence/Sentence';
import type { Design } from '../../../src/lib/orders/views';
import { design, diode, machine, orderView } from '../order-fixtures';

const machines = [machine, diode];
let kept: Design[] = [];

function Page({ start = design, isDisabled = false }: { start?: Design; isDisabled?: boolean }) {
  const [now, setNow] = useState(start);
  const change = (next: Design) => {
    kept.push(next);
    setNow(next);
  };
  return (
    <Sentence
      design={now}
      before={design}
      context={choiceContext(now, machines, orderView())}
      onChange={change}
      isDisabled={isDisabled}
    />
  );
}

beforeEach(() => {
  kept = [];
  vi.stubGlobal('CSS', { escape: (text: string) => text });
  vi.stubGlobal('matchMedia', () => ({
    matches: false,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

const sentence = () =>
  screen.getByRole('region', { name: 'Instruction' }).querySelector('p')?.textContent ?? '';

describe('Sentence', () => {
  it('reads as one sentence in which every choice is a button', () => {
    render(<Page />);
    expect(sentence()).toBe(
      'Screen as halftone with Floyd–Steinberg 1976, lines 0.110 mm apart, scanning at 0°, one pass, tone absolute, not mirrored. Run on Heron with the 0.07 × 0.11 mm spot, on Birch plywood 4 mm, at 42 % power, 320 mm/s, in focus.',
    );
    expect(screen.getByRole('button', { name: '0.110 mm: change line pitch' })).toBeTruthy();
    expect(screen.queryByText('Put back')).toBeNull();
  });

  it('opens only the choice of the word, and puts it back', async () => {
    render(<Page />);
    fireEvent.click(screen.getByRole('button', { name: 'not mirrored: change mirror' }));
    const dialog = await screen.findByRole('dialog', { name: 'Mirror' });
    expect(screen.getAllByRole('dialog')).toHaveLength(1);
    fireEvent.click(within(dialog).getByRole('radio', { name: /^Mirrored/ }));
    expect(kept.at(-1)?.mirror).toBe(true);
    const back = await screen.findByText('Put back');
    expect(back.textContent).toBe('Put back mirror');
    fireEvent.click(back);
    expect(kept.at(-1)).toEqual(design);
    expect(screen.queryByText('Put back')).toBeNull();
  });

  it('recommends a pitch for another spot without changing it', async () => {
    render(<Page start={{ ...design, spotPresetId: 3 }} />);
    expect(sentence()).toContain('lines 0.110 mm');
    fireEvent.click(screen.getByRole('button', { name: '0.110 mm: change line pitch' }));
    const dialog = await screen.findByRole('dialog', { name: 'Line pitch' });
    expect(dialog.textContent).toContain('Pitch ratio 0.61: lines overlap by 0.070 mm.');
    expect(dialog.textContent).toContain('545 scan lines on 60 mm.');
    expect(kept).toEqual([]);
    fireEvent.click(within(dialog).getByRole('button', { name: 'Use 0.180 mm' }));
    expect(kept.at(-1)?.scan).toEqual({ directionDeg: 0, linePitchMm: 0.18, alongPitchMm: 0.18 });
  });

  it('keeps nothing of a recipe until every figure is typed', async () => {
    render(<Page start={{ ...design, recipe: null }} />);
    fireEvent.click(screen.getByRole('button', { name: /power and speed not yet typed/ }));
    const dialog = await screen.findByRole('dialog', { name: 'Power, speed and focus' });
    const power = within(dialog).getByRole('textbox', { name: /Power/ });
    fireEvent.change(power, { target: { value: '42' } });
    fireEvent.blur(power);
    expect(kept).toEqual([]);
    expect(dialog.textContent).toContain('Dose and time follow once every figure is typed.');
    const speed = within(dialog).getByRole('textbox', { name: /Speed/ });
    fireEvent.change(speed, { target: { value: '320' } });
    fireEvent.blur(speed);
    expect(kept.at(-1)?.recipe).toEqual(design.recipe);
    expect(dialog.textContent).toContain('Dose 0.477 J/mm², assumes linear power.');
  });

  it('offers every figure as one plain form that changes nothing until it is kept', async () => {
    render(<Page />);
    fireEvent.click(screen.getByRole('button', { name: 'All figures' }));
    const dialog = await screen.findByRole('dialog', { name: 'All figures' });
    const level = within(dialog).getByRole('textbox', { name: /Dividing level/ });
    fireEvent.change(level, { target: { value: '60' } });
    fireEvent.blur(level);
    expect(kept).toEqual([]);
    fireEvent.click(within(dialog).getByRole('button', { name: 'Keep these figures' }));
    await vi.waitFor(() => expect(kept).toEqual([{ ...design, dividingLstar: 60 }]));
  });

  it('is plain text where nothing can be changed any more', () => {
    render(<Page isDisabled />);
    expect(screen.queryAllByRole('button')).toHaveLength(0);
    expect(sentence()).toContain('Screen as halftone');
  });
});
