import { describe, expect, it } from 'vitest';
import { problemSchema } from '@/lib/orders/views';
import { AppError, REFUSALS, type RefusalCode } from '@/lib/server/errors';

const codes = Object.keys(REFUSALS) as RefusalCode[];

describe('refusals', () => {
  it.each(codes)('%s says what happened, why and what to do, in sentences and without blame', (code) => {
    const { status, problem } = new AppError(code);
    problemSchema.parse(problem);
    expect(status).toBeGreaterThanOrEqual(400);
    expect(status).toBeLessThan(600);
    for (const words of [problem.title, problem.detail, problem.action]) {
      expect(words).toMatch(/^[A-Z“].*\.$/);
      expect(words).not.toMatch(/oops|invalid|error|sorry|!/i);
    }
  });
});

describe('AppError', () => {
  it('takes the words of the case where it knows better', () => {
    const { problem } = new AppError('too-large', { detail: 'A form may have 256 KiB.' });
    expect(problem).toEqual({ ...new AppError('too-large').problem, detail: 'A form may have 256 KiB.' });
  });

  it('keeps what caused it', () => {
    const cause = new Error('disk');
    expect(new AppError('broken', {}, { cause }).cause).toBe(cause);
  });
});
