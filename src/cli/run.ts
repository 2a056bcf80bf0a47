import { nodeTools } from '../rendering/node-tools';
import { ArtworkError } from '../lib/prepare/tools';
import { readArguments, type TypedCommand } from './arguments';
import { runCheck } from './run-check';
import { EXIT, type ExitStatus } from './exit-status';
import { helpText } from './help';
import { runPrepare } from './run-prepare';
import type { Surroundings } from './surroundings';
import { UsageError } from './usage-error';

/** One plain line, whatever the message holds. */
const oneLine = (text: string): string => `${text.replace(/\s+/g, ' ').trim()}\n`;

function answerTo(error: unknown): { message: string; status: ExitStatus } {
  if (error instanceof UsageError) return { message: error.message, status: EXIT.wrongUsage };
  if (error instanceof ArtworkError) return { message: error.message, status: EXIT.unreadable };
  const reason = error instanceof Error ? error.message : String(error);
  return { message: `This did not work: ${reason}`, status: EXIT.trouble };
}

async function dispatch(typed: TypedCommand, around: Surroundings): Promise<ExitStatus> {
  const tools = nodeTools({ root: around.root });
  return typed.command === 'check' ? runCheck(typed, tools, around) : runPrepare(typed, tools, around);
}

/** Runs one command line and gives its exit status; never throws. */
export async function run(argv: readonly string[], around: Surroundings): Promise<ExitStatus> {
  try {
    const typed = readArguments(argv);
    if (typed === null) {
      around.stdout(helpText());
      return EXIT.fine;
    }
    return await dispatch(typed, around);
  } catch (error) {
    const { message, status } = answerTo(error);
    around.stderr(oneLine(message));
    return status;
  }
}
