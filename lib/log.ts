// server only
import pino from 'pino';
import { env } from './env';

/** The log of the server: one JSON line an event, causes with their stack, no personal data beyond ids. */
export const log = pino({ level: env().logLevel, base: null });
