import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { DEBIAN_PYTHON } from '../setup/reference-tool';

export const COLUMNS = 5000;
export const ROWS = 3333;

type Command = readonly [string, ...string[]];

function call([command, ...args]: Command): { seconds: number; stdout: string } {
  const began = performance.now();
  const outcome = spawnSync(command, args, { encoding: 'utf8' });
  const seconds = (performance.now() - began) / 1000;
  if (outcome.error) throw outcome.error;
  if (outcome.status !== 0) throw new Error(`${command} ${args.join(' ')}: ${outcome.stderr}`);
  return { seconds, stdout: outcome.stdout };
}

/** Seconds of commands without those that each process needs to start, which a call that does nothing shows. */
function withoutStart(commands: readonly Command[], nothing: Command): number {
  return commands.reduce((sum, command) => {
    const start = call(nothing).seconds;
    return sum + Math.max(0, call(command).seconds - start);
  }, 0);
}

const PILLOW = `
import sys, time
from PIL import Image
began = time.perf_counter()
picture = Image.open(sys.argv[1]).convert('L').resize((${COLUMNS}, ${ROWS}))
picture.convert('1').save(sys.argv[2])
print(time.perf_counter() - began)
`;

/** Resize, Floyd–Steinberg, 1-bit PNG by Pillow, timed inside Python, s. */
export const pillowSeconds = (jpeg: string, folder: string): number =>
  Number(call([DEBIAN_PYTHON, '-c', PILLOW, jpeg, path.join(folder, 'pillow.png')]).stdout);

/** The same by ImageMagick, s. */
export function magickSeconds(jpeg: string, folder: string): number {
  const resize = ['-colorspace', 'Gray', '-resize', `${COLUMNS}x${ROWS}!`];
  const dots = ['-dither', 'FloydSteinberg', '-monochrome', '-depth', '1'];
  return withoutStart(
    [['convert', jpeg, ...resize, ...dots, path.join(folder, 'magick.png')]],
    ['convert', '-version'],
  );
}

/** The same by libvips, whose only error diffusion is the one of its palette writer, s. */
export function vipsSeconds(jpeg: string, folder: string): number {
  const [grey, large, dots] = ['grey.v', 'large.v', 'vips.png'].map((name) => path.join(folder, name));
  return withoutStart(
    [
      ['vips', 'colourspace', jpeg, grey, 'b-w'],
      ['vips', 'resize', grey, large, String(COLUMNS / 2400), '--vscale', String(ROWS / 1600)],
      ['vips', 'pngsave', large, dots, '--palette', '--bitdepth', '1', '--dither', '1'],
    ],
    ['vips', '--version'],
  );
}

/** Debian's potrace on a PBM, with the settings that ours is given, s. */
export function potraceSeconds(pbm: string, folder: string): number {
  const settings = ['--svg', '--flat', '-t', '2', '-a', '1', '-O', '0.2'];
  return withoutStart(
    [['potrace', ...settings, '-o', path.join(folder, 'potrace.svg'), pbm]],
    ['potrace', '--version'],
  );
}
