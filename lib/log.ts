import 'server-only';
import pino from 'pino';
import { toldError } from '@/db/told-error';

/** One JSON object a line, UTC, secrets redacted; an error without the values that it was about. */
export const log = pino({
  level: process.env.LOG_LEVEL ?? 'info',
  base: null,
  timestamp: pino.stdTimeFunctions.isoTime,
  redact: ['*.password', '*.token', '*.cookie', 'password', 'token', 'cookie'],
  serializers: { err: toldError },
});
