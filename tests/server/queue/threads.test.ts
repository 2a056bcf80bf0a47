import { dataDir } from '../../setup/database';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { settingsSchema } from '@/lib/prepare/settings';
import { closeThreads, pipelineInThreads } from '@/lib/server/queue/threads';

void dataDir;
const sample = (name: string): Uint8Array => new Uint8Array(readFileSync(path.resolve('samples', name)));
const quiet = () => ({
  signal: new AbortController().signal,
  progress: (_stage: string, _progress: number): void => undefined,
});
const settings = (over = {}) =>
  settingsSchema.parse({
    widthMm: 30,
    heightMm: 30,
    spot: { widthMm: 0.12, heightMm: 0.12 },
    treatment: 'solid',
    tone: {},
    label: 'U-1001',
    scan: { directionDeg: 0, linePitchMm: 0.12, alongPitchMm: 0.12 },
    ...over,
  });
const checkSettings = {
  widthMm: 30,
  heightMm: 30,
  quarterTurns: 0,
  spot: { widthMm: 0.12, heightMm: 0.12, shape: 'ellipse' },
  firing: 'swept',
  directionDeg: 0,
  linePitchMm: null,
  treatment: null,
  dividingLstar: 53.4,
  blank: null,
  machine: null,
} as const;

afterAll(closeThreads);

describe('the pipeline in threads', () => {
  const pipeline = pipelineInThreads();

  it('reads artwork by its bytes', async () => {
    expect(await pipeline.read(sample('stamp.png'))).toEqual({ format: 'png' });
    expect(await pipeline.read(sample('bakery-mark.svg'))).toEqual({ format: 'svg' });
  });

  it.each(['half-a-file.png', 'no-bytes.png', 'not-artwork.pdf'])(
    'refuses %s in words that survive the thread',
    async (name) => {
      await expect(pipeline.read(sample(name))).rejects.toMatchObject({
        name: 'ArtworkError',
        message: expect.stringMatching(/\.$/),
      });
    },
  );

  it('checks, and says in words how far it is', async () => {
    const told: [string, number][] = [];
    const context = {
      ...quiet(),
      progress: (stage: string, progress: number) => void told.push([stage, progress]),
    };
    const { report, picture } = await pipeline.check(sample('bakery-mark.svg'), checkSettings, context);
    expect(report).toMatchObject({ widthMm: 30, artwork: { format: 'svg' } });
    expect([...picture.slice(1, 4)]).toEqual([0x50, 0x4e, 0x47]);
    expect(told.map(([stage]) => stage)).toContain('Measuring');
    for (const [stage] of told) expect(stage, 'a stage in words').toMatch(/^[A-Z]/);
    const progresses = told.map(([, progress]) => progress);
    expect(progresses).toEqual([...progresses].sort((a, b) => a - b));
  });

  it('prepares under the key that was known before, with the same bytes each time', async () => {
    const request = { settings: settings(), artworkVersion: 1 };
    const bytes = sample('stamp.png');
    const told: string[] = [];
    const first = await pipeline.prepare(bytes, request, {
      ...quiet(),
      progress: (stage) => void told.push(stage),
    });
    for (const stage of told) expect(stage, 'a stage in words').toMatch(/^[A-Z]/);
    const second = await pipeline.prepare(bytes, request, quiet());
    expect(first.key).toBe(await pipeline.keyOf(first.manifest.artworkSha256, request));
    expect(second.manifestSha256).toBe(first.manifestSha256);
    expect(second.files.map(({ bytes: file }) => Buffer.from(file).toString('base64'))).toEqual(
      first.files.map(({ bytes: file }) => Buffer.from(file).toString('base64')),
    );
  });

  it('gives another key to any other request', async () => {
    const keys = await Promise.all([
      pipeline.keyOf('a'.repeat(64), { settings: settings(), artworkVersion: 1 }),
      pipeline.keyOf('b'.repeat(64), { settings: settings(), artworkVersion: 1 }),
      pipeline.keyOf('a'.repeat(64), { settings: settings(), artworkVersion: 2 }),
      pipeline.keyOf('a'.repeat(64), { settings: settings({ widthMm: 30.1 }), artworkVersion: 1 }),
      pipeline.keyOf('a'.repeat(64), { settings: settings({ mirror: true }), artworkVersion: 1 }),
    ]);
    expect(new Set(keys).size).toBe(5);
  });

  it('ends a thread that is told to stop, and works on', async () => {
    const abort = new AbortController();
    const long = pipeline.prepare(
      sample('alpine-photograph.jpg'),
      { settings: settings({ widthMm: 300, heightMm: 225, treatment: 'halftone' }), artworkVersion: 1 },
      {
        signal: abort.signal,
        progress: () => abort.abort(new Error('enough')),
      },
    );
    await expect(long).rejects.toThrow();
    expect(await pipeline.read(sample('stamp.png'))).toEqual({ format: 'png' });
  });

  it('keeps the site quick while it works', async () => {
    const delays: number[] = [];
    let last = performance.now();
    const clock = setInterval(() => {
      delays.push(performance.now() - last - 10);
      last = performance.now();
    }, 10);
    await pipeline.check(sample('still-life.png'), { ...checkSettings, widthMm: 90, heightMm: 90 }, quiet());
    clearInterval(clock);
    delays.sort((a, b) => a - b);
    expect(delays[Math.floor(delays.length * 0.9)]).toBeLessThan(100);
  });
});
