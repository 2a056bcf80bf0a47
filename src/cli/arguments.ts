import { parseArgs } from 'node:util';
import { isOption, OPTIONS, takesValue, type OptionName } from './option-table';
import { UsageError } from './usage-error';

/** A command as typed, before its values are read. */
export interface TypedCommand {
  command: 'check' | 'prepare';
  artwork: string;
  values: Partial<Record<OptionName, string>>;
  switches: ReadonlySet<OptionName>;
}

/** `--direction-deg -45` becomes `--direction-deg=-45`: a negative number is a value and no option. */
function joinNegatives(argv: readonly string[]): string[] {
  const joined: string[] = [];
  for (const arg of argv) {
    const before = joined.at(-1) ?? '';
    const name = before.slice(2);
    if (/^-[\d.]/.test(arg) && before.startsWith('--') && isOption(name) && takesValue(name)) {
      joined[joined.length - 1] = `${before}=${arg}`;
    } else joined.push(arg);
  }
  return joined;
}

function parse(argv: readonly string[]): { tokens: Map<OptionName, string | true>; positionals: string[] } {
  const names = Object.keys(OPTIONS) as OptionName[];
  const options = Object.fromEntries(
    names.map((name) => [name, { type: takesValue(name) ? ('string' as const) : ('boolean' as const) }]),
  );
  try {
    const { values, positionals } = parseArgs({ args: joinNegatives(argv), options, allowPositionals: true });
    const tokens = new Map<OptionName, string | true>();
    for (const [name, value] of Object.entries(values)) {
      if (isOption(name) && (typeof value === 'string' || value === true)) tokens.set(name, value);
    }
    return { tokens, positionals };
  } catch (error) {
    const reason = error instanceof Error ? error.message.split('\n')[0].split('. ')[0] : String(error);
    throw new UsageError(`${reason}. --help lists the options.`, { cause: error });
  }
}

/** Reads the words of a command line; null asks for the help text. */
export function readArguments(argv: readonly string[]): TypedCommand | null {
  const { tokens, positionals } = parse(argv);
  if (tokens.has('help') || (argv.length === 1 && argv[0] === 'help')) return null;
  const [command, artwork, ...rest] = positionals;
  if (command !== 'check' && command !== 'prepare') {
    throw new UsageError(
      `The command is check or prepare, got ${command ? `"${command}"` : 'none'}. --help explains both.`,
    );
  }
  if (!artwork) throw new UsageError(`${command} needs the path of an artwork. --help explains it.`);
  if (rest.length > 0) throw new UsageError(`${command} takes one artwork, got also "${rest.join('", "')}".`);
  for (const name of tokens.keys()) {
    if (!(OPTIONS[name].commands as readonly string[]).includes(command)) {
      throw new UsageError(`--${name} belongs to prepare, not to ${command}.`);
    }
  }
  const values: TypedCommand['values'] = {};
  const switches = new Set<OptionName>();
  for (const [name, value] of tokens) {
    if (value === true) switches.add(name);
    else values[name] = value;
  }
  return { command, artwork, values, switches };
}
