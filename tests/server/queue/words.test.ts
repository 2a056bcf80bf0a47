import '../../setup/database';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { ArtworkError } from '@/lib/prepare/tools';
import { AppError } from '@/lib/server/errors';
import { failureOf, TimeLimitError } from '@/lib/server/queue/failure';
import { workProgress } from '@/lib/server/queue/stage-words';
import { isDiskFull } from '@/lib/server/storage/disk-full';
import { StorageError } from '@/lib/server/storage/storage';

const coded = (code: string): Error => Object.assign(new Error('write'), { code });

describe('why a task failed', () => {
  it.each<[string, unknown, RegExp, boolean]>([
    [
      'artwork',
      new ArtworkError('truncated', 'The file ends too early.'),
      /^The file ends too early\.$/,
      false,
    ],
    ['a refusal', new AppError('no-room'), /disk is nearly full\. .*Tell the shop/, false],
    ['time, short', new TimeLimitError(30_000), /longer than 30 seconds/, false],
    ['time, long', new TimeLimitError(300_000), /longer than 5 minutes/, false],
    ['a full disk', coded('ENOSPC'), /disk is full/, true],
    [
      'a full database',
      new Error('x', { cause: new Error('y', { cause: coded('SQLITE_FULL') }) }),
      /disk is full/,
      true,
    ],
    ['a missing file', new StorageError('missing', 'nothing'), /Send the artwork again/, false],
    ['data that do not fit', new z.ZodError([]), /broke on our side/, false],
    ['anything else', new Error('segfault in libfoo'), /Start it again/, true],
    ['nothing at all', undefined, /Start it again/, true],
  ])('%s', (_, error, words, again) => {
    const failure = failureOf(error);
    expect(failure.words).toMatch(words);
    expect(failure.words).not.toMatch(/libfoo|undefined|Error:/);
    expect(failure.again).toBe(again);
  });
});

describe('a full disk', () => {
  it.each([null, undefined, 'ENOSPC', 28, new Error('ENOSPC'), coded('EACCES')])(
    'is not seen in %s',
    (error) => {
      expect(isDiskFull(error)).toBe(false);
    },
  );
});

describe('progress', () => {
  it.each(['check', 'prepare'] as const)(
    'of a %s runs from 0 to 1 through its stages without a step back',
    (work) => {
      const stages =
        work === 'check'
          ? ['ingest', 'measure', 'sound-width', 'preflight', 'picture']
          : ['ingest', 'measure', 'sound-width', 'preflight', 'mark', 'trace', 'package', 'forecast'];
      const seen = stages.flatMap((stage) => [0, 0.5, 1].map((share) => workProgress(work, stage, share)));
      const shares = seen.map(({ progress }) => progress);
      expect(shares).toEqual([...shares].sort((a, b) => a - b));
      expect([shares[0], shares.at(-1)]).toEqual([0, 1]);
      for (const { words } of seen) expect(words).toMatch(/^[A-Z][a-z ]+$/);
    },
  );

  it('of an unknown stage is named as it is', () => {
    expect(workProgress('check', 'other', 1)).toEqual({ words: 'other', progress: 0 });
  });
});
