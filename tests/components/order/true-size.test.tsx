// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { TrueSize } from '@/components/order/TrueSize';
import { keepScale, keptScale } from '@/components/order/screen-scale';
import { stubBrowser } from '../stub-browser';

beforeEach(() => {
  window.localStorage.clear();
  stubBrowser();
});
afterEach(cleanup);

const open = () => fireEvent.click(screen.getByRole('button', { name: 'See true size' }));

describe('TrueSize', () => {
  test('asks for a bank card once, then shows the forecast in millimetres of this screen', () => {
    render(<TrueSize src="/burned.png" widthMm={84} heightMm={60} />);
    open();
    expect(screen.getByText(/Hold a bank card/)).toBeTruthy();
    // 428 px are 5 px per mm over the 85.6 mm of a card (ISO/IEC 7810 ID-1).
    fireEvent.change(screen.getByRole('slider'), { target: { value: '428' } });
    fireEvent.click(screen.getByRole('button', { name: 'It matches' }));
    expect(keptScale()).toBeCloseTo(5, 6);
    const picture = screen.getByAltText('The burn forecast at true size');
    expect(picture.style.width).toBe('420px');
    expect(picture.style.height).toBe('300px');
  });

  test('does not ask again, unless it is told to', () => {
    keepScale(4);
    render(<TrueSize src="/burned.png" widthMm={84} heightMm={60} />);
    open();
    expect(screen.getByAltText('The burn forecast at true size').style.width).toBe('336px');
    fireEvent.click(screen.getByRole('button', { name: 'Measure the screen again' }));
    expect(screen.getByText(/Hold a bank card/)).toBeTruthy();
  });

  test('a kept figure that cannot be is not believed', () => {
    window.localStorage.setItem('umberline-px-per-mm', '0');
    expect(keptScale()).toBeNull();
    window.localStorage.setItem('umberline-px-per-mm', 'much');
    expect(keptScale()).toBeNull();
  });
});
