import { DEFAULT_SCREEN, SCREEN_NAMES, type ScreenName } from '../lib/prepare/settings';
import { wordValue } from './option-values';
import { UsageError } from './usage-error';

/** Screens that are named in the trade and that Umberline does not have yet. */
const LATER = ['spot-aware', 'clustered-dot'];

/** The screen that a command names. */
export function readScreen(text: string | undefined): ScreenName {
  if (text !== undefined && LATER.includes(text)) {
    throw new UsageError(`--screen ${text} comes later; there are ${SCREEN_NAMES.join(', ')}.`);
  }
  return text === undefined ? DEFAULT_SCREEN : wordValue('screen', text, SCREEN_NAMES);
}
