import 'server-only';
import pino from 'pino';

/** One JSON object a line, UTC, secrets redacted. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? 'info',
  base: null,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: ['*.password', '*.token', '*.cookie', 'password', 'token', 'cookie'],
});
