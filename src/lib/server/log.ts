import { pino } from 'pino';
import { config } from './config';

/** One line of JSON per entry on standard output; secrets never reach it. */
export const log = pino({
  level: config().logLevel,
  base: undefined,
  redact: {
    paths: ['password', 'token', '*.password', '*.token', 'req.headers.cookie'],
    censor: '(kept back)',
  },
});
