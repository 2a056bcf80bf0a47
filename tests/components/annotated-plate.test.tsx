// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, test } from 'vitest';
import { AnnotatedPlate } from '@/components/AnnotatedPlate';
import { findings } from './order-fixtures';

afterEach(cleanup);

function shown(list = findings) {
  return render(
    <AnnotatedPlate
      src="/picture.png"
      alt="A mark"
      widthMm={90}
      heightMm={60}
      linePitchMm={0.11}
      findings={list}
    />,
  );
}
const noteOf = (container: Element, id: string) =>
  container.querySelector<HTMLElement>(`[data-note="${id}"]`)!;
const litPlaces = (container: Element) =>
  [...container.querySelectorAll('.place[data-lit="true"]')].map((place) => place.getAttribute('data-place'));

describe('AnnotatedPlate', () => {
  test('a note says severity in words, title, shortfall, count and advice', () => {
    const { container } = shown();
    const text = noteOf(container, 'hairline').textContent ?? '';
    for (const words of [
      'Blocker',
      'Hairlines',
      'Too thin by 0.07 mm',
      '14 places',
      'Make them at least 0.11 mm wide.',
    ])
      expect(text).toContain(words);
  });

  test('a note that is focused lights its places, and leaves the others', () => {
    const { container } = shown();
    fireEvent.focus(within(noteOf(container, 'hairline')).getByRole('button'));
    expect(litPlaces(container)).toEqual(['hairline', 'hairline', 'hairline']);
    expect(noteOf(container, 'hairline').querySelector('.note')?.getAttribute('data-lit')).toBe('true');
    fireEvent.focus(within(noteOf(container, 'fill-in')).getByRole('button'));
    expect(litPlaces(container)).toEqual(['fill-in']);
  });

  test('a place that is tapped lights its note', () => {
    const { container } = shown();
    fireEvent.click(container.querySelector('.place[data-place="fill-in"]')!);
    expect(noteOf(container, 'fill-in').querySelector('.note')?.getAttribute('data-lit')).toBe('true');
  });

  test('a place lies where it was found, as a share of the plate', () => {
    const { container } = shown();
    const place = container.querySelector<HTMLElement>('.place[data-place="fill-in"]')!;
    expect(parseFloat(place.style.left)).toBeCloseTo((100 * 40) / 90, 6);
    expect(parseFloat(place.style.top)).toBeCloseTo((100 * 30) / 60, 6);
  });

  test('sizes stand as dimension lines, and the rule counts millimetres and scan lines', () => {
    const { container } = shown();
    expect(container.textContent).toContain('90mm');
    expect(container.textContent).toContain('60mm');
    expect(screen.getByRole('img', { name: 'Rule: 90 mm, 818 scan lines at 0.11 mm' })).toBeTruthy();
  });

  test('where nothing was found, it says so', () => {
    shown([]);
    expect(screen.getByText('Nothing to note. The laser can hold it.')).toBeTruthy();
  });
});
