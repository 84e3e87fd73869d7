import 'server-only';
import pino from 'pino';

/** Structured log of the server; never holds secrets, mail bodies or amounts of a person. */
export const log = pino({ level: process.env.LOG_LEVEL ?? 'info', base: undefined });
