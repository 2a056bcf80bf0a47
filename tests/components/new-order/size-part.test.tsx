// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { FormProvider, useForm } from 'react-hook-form';
import { I18nProvider } from 'react-aria-components/I18nProvider';
import { afterEach, describe, expect, test } from 'vitest';
import type { LengthUnit } from '@/components/LengthField';
import { EMPTY_FORM, type DraftForm } from '@/components/new-order/draft-form';
import { SizePart } from '@/components/new-order/SizePart';
import type { CheckReport } from '@/lib/prepare/report';
import { CHECK } from './check-fixture';

afterEach(cleanup);

let held: DraftForm;

function Held({ check }: { check: CheckReport | null }) {
  const form = useForm<DraftForm>({ defaultValues: EMPTY_FORM });
  const [unit, setUnit] = useState<LengthUnit>('mm');
  held = form.watch();
  return (
    <I18nProvider locale="en-GB">
      <FormProvider {...form}>
        <SizePart check={check} unit={unit} onUnit={setUnit} />
      </FormProvider>
    </I18nProvider>
  );
}

function enter(label: RegExp, text: string): void {
  const field = screen.getByLabelText(label);
  fireEvent.focus(field);
  fireEvent.change(field, { target: { value: text } });
  fireEvent.blur(field);
}
const shown = (label: RegExp) => screen.getByLabelText<HTMLInputElement>(label).value;

describe('SizePart', () => {
  test('the other side follows while the proportions are kept', () => {
    render(<Held check={CHECK} />);
    enter(/^Width/, '84');
    expect([held.widthMm, held.heightMm]).toEqual([84, 42]);
    enter(/^Height/, '50');
    expect([held.widthMm, held.heightMm]).toEqual([100, 50]);
  });

  test('unlocked, each side stands for itself', () => {
    render(<Held check={CHECK} />);
    fireEvent.click(screen.getByLabelText('Keep the proportions'));
    enter(/^Width/, '84');
    enter(/^Height/, '20');
    expect([held.widthMm, held.heightMm]).toEqual([84, 20]);
  });

  test('looking at a size in inches changes nothing; entering one is kept in mm', () => {
    render(<Held check={CHECK} />);
    enter(/^Width/, '84');
    fireEvent.click(screen.getByLabelText('inches'));
    expect(shown(/^Width/)).toBe('3.307');
    expect(held.widthMm).toBe(84);
    fireEvent.focus(screen.getByLabelText(/^Width/));
    fireEvent.blur(screen.getByLabelText(/^Width/));
    expect(held.widthMm).toBe(84);
    enter(/^Width/, '4');
    expect([held.widthMm, held.heightMm]).toEqual([101.6, 50.8]);
    fireEvent.click(screen.getByLabelText('mm'));
    expect(shown(/^Width/)).toBe('101.6');
  });

  test('the file’s own size is offered, not taken', () => {
    render(<Held check={CHECK} />);
    expect(screen.getByText(/The file says/).textContent).toContain('140 × 70 mm');
    expect(held.widthMm).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Use the file’s own size' }));
    expect([held.widthMm, held.heightMm]).toEqual([140, 70]);
    expect(screen.queryByRole('button', { name: 'Use the file’s own size' })).toBeNull();
  });

  test('a file without a size is asked about', () => {
    render(<Held check={{ ...CHECK, artwork: { ...CHECK.artwork, ownWidthMm: null, ownHeightMm: null } }} />);
    expect(screen.getByText(/does not say how big/)).toBeTruthy();
    expect(screen.queryByRole('button')).toBeNull();
    expect(shown(/^Width/)).toBe('');
  });

  test('a figure out of range stays as typed and says its range', () => {
    render(<Held check={CHECK} />);
    enter(/^Width/, '5000');
    expect(shown(/^Width/)).toBe('5000');
    expect(screen.getByText('Enter a figure from 1 to 3000 mm.')).toBeTruthy();
  });
});
