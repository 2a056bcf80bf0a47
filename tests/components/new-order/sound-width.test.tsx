// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { SoundWidth } from '@/components/new-order/SoundWidth';
import { CHECK } from './check-fixture';

afterEach(cleanup);

describe('SoundWidth', () => {
  test('offers the smallest width at which all holds, rounded up', () => {
    const use = vi.fn();
    const { container } = render(<SoundWidth check={CHECK} unit="mm" onUse={use} />);
    expect(container.textContent).toContain('Every line and gap holds from 220.1mm wide.');
    fireEvent.click(screen.getByRole('button', { name: 'Use this size' }));
    expect(use).toHaveBeenCalledWith(220.1);
  });

  test('in inches it says inches and still hands over mm', () => {
    const use = vi.fn();
    const { container } = render(<SoundWidth check={CHECK} unit="in" onUse={use} />);
    expect(container.textContent).toContain('8.665in');
    fireEvent.click(screen.getByRole('button', { name: 'Use this size' }));
    expect(use).toHaveBeenCalledWith(220.1);
  });

  test('a size that holds already is not to be changed', () => {
    const { container } = render(<SoundWidth check={{ ...CHECK, widthMm: 240 }} unit="mm" onUse={vi.fn()} />);
    expect(container.textContent).toContain('holds down to');
    expect(screen.queryByRole('button')).toBeNull();
  });

  test('says nothing of photographs', () => {
    const { container } = render(
      <SoundWidth check={{ ...CHECK, smallestSoundWidthMm: null }} unit="mm" onUse={vi.fn()} />,
    );
    expect(container.textContent).toBe('');
  });
});
