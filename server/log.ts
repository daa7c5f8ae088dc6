import { pino, type Logger } from 'pino';
import type { Config } from './config';

/** JSON lines on standard output, times in UTC. Known secret fields are blanked wherever an object is logged. */
export function createLogger(config: Pick<Config, 'logLevel'>): Logger {
  return pino({
    level: config.logLevel,
    base: { pid: process.pid },
    timestamp: () => `,"time":"${new Date().toISOString()}"`,
    redact: { paths: ['password', 'secret', 'token', '*.password', '*.secret', '*.token', '*.parameters', '*.driverError.parameters'], censor: '[hidden]' },
  });
}
