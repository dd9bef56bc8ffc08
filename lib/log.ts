import 'server-only';
import pino from 'pino';
import { toldError } from '@/db/told-error';

/** One JSON object a line, UTC, secrets redacted; an error without the values that it was about. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? 'info',
  base: null,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: ['*.password', '*.token', '*.cookie', 'password', 'token', 'cookie'],
  hooks: {
    // Of an error pino would repeat the whole message beside it, values and all; of a plain object it doesn't.
    logMethod(args, method) {
      const [first] = args as unknown[];
      if (first && typeof first === 'object' && 'err' in first)
        Object.assign(args, [{ ...first, err: toldError(first.err) }]);
      method.apply(this, args);
    },
  },
});
