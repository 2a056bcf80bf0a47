import { DEFAULT_SCREEN, SCREEN_NAMES } from '../lib/prepare/settings';
import { OPTIONS, takesValue, type OptionName } from './option-table';

const WIDTH = 92;
const INDENT = 32;

function wrap(text: string): string {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(' ')) {
    if (line && line.length + word.length + 1 > WIDTH - INDENT) {
      lines.push(line);
      line = word;
    } else line = line ? `${line} ${word}` : word;
  }
  return [...lines, line].join(`\n${' '.repeat(INDENT)}`);
}

function optionLine(name: OptionName): string {
  const option = OPTIONS[name];
  const written = `  --${name}${takesValue(name) && 'value' in option ? ` ${option.value}` : ''}`;
  return `${written.padEnd(INDENT)}${wrap(option.help)}`;
}

const linesFor = (choose: (commands: readonly string[]) => boolean): string =>
  (Object.keys(OPTIONS) as OptionName[])
    .filter((name) => choose(OPTIONS[name].commands))
    .map(optionLine)
    .join('\n');

/** Everything that the command line can do, in words. */
export function helpText(): string {
  return `umberline finds what will not engrave in an artwork and prepares it for one machine and stock.
It prepares marks; it never drives a laser.

  umberline check ART --width-mm W --spot WxH [options]
  umberline prepare ART --width-mm W --spot WxH --treatment T --out DIR [options]

ART is a PNG, JPEG, WebP, TIFF, GIF, AVIF, BMP or SVG file. check says what was found and how small
the artwork may be engraved. prepare writes the machine-ready files, report.json and
manifest.json, also when something was found that should stop the work: see the exit status.

Both:
${linesFor((commands) => commands.includes('check'))}

prepare alone:
${linesFor((commands) => !commands.includes('check'))}

Screens:
  ${SCREEN_NAMES.map((name) => (name === DEFAULT_SCREEN ? `${name} (unless said otherwise)` : name)).join('\n  ')}
  Published screens are named by author and year and are there for comparison.

Exit status:
  0  fine
  1  there are blockers
  2  the command was typed wrongly; the message names the option and its range
  3  the artwork cannot be read
  4  the files could not be written, or something else went wrong

Example:
  umberline check samples/bakery-mark.svg --width-mm 60 --spot 0.07x0.11 --json
`;
}
