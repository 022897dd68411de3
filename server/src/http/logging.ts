import { randomUUID } from 'node:crypto';

import type { LoggerService } from '@nestjs/common';
import { pino, type Logger } from 'pino';
import { pinoHttp } from 'pino-http';

import type { AppConfig } from '#server/config/environment';

/** Replaces what would open a door if read in a log: tokens in addresses, queries altogether. */
export function addressForLog(url: string): string {
  return url.replace(/\?.*$/, '').replace(/\/[A-Za-z0-9_-]{43}(?=\/|$)/g, '/…');
}

export const createLogger = (config: Pick<AppConfig, 'logLevel'>): Logger =>
  pino({ level: config.logLevel, base: null });

/** Logs requests by method, address, status and time; no headers, cookies or bodies. */
export const requestLogging = (logger: Logger) =>
  pinoHttp({
    logger,
    genReqId: (request, response) => {
      const given = request.headers['x-request-id'];
      const id = typeof given === 'string' && /^[\w-]{8,64}$/.test(given) ? given : randomUUID();
      response.setHeader('x-request-id', id);
      return id;
    },
    customLogLevel: (_request, response, error) => {
      if (error !== undefined || response.statusCode >= 500) {
        return 'error';
      }
      return response.statusCode >= 400 ? 'info' : 'debug';
    },
    serializers: {
      req: (request: { id: string; method: string; url: string }) => ({
        id: request.id,
        method: request.method,
        address: addressForLog(request.url),
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });

/** Parts of Nest whose every line at start is of interest to nobody but a debugger. */
const chattyParts = new Set<unknown>(['InstanceLoader', 'RoutesResolver', 'RouterExplorer']);

type Level = 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'trace';

/** Lets Nest and everything that uses its `Logger` write to the same log. */
export class PinoLoggerService implements LoggerService {
  constructor(private readonly logger: Logger) {}

  log(message: unknown, ...rest: unknown[]): void {
    this.write(chattyParts.has(rest.at(-1)) ? 'debug' : 'info', message, rest);
  }

  error(message: unknown, ...rest: unknown[]): void {
    this.write('error', message, rest);
  }

  warn(message: unknown, ...rest: unknown[]): void {
    this.write('warn', message, rest);
  }

  debug(message: unknown, ...rest: unknown[]): void {
    this.write('debug', message, rest);
  }

  verbose(message: unknown, ...rest: unknown[]): void {
    this.write('trace', message, rest);
  }

  fatal(message: unknown, ...rest: unknown[]): void {
    this.write('fatal', message, rest);
  }

  /** Nest passes a stack (errors only) and the name of the part as trailing strings. */
  private write(level: Level, message: unknown, rest: unknown[]): void {
    const part = rest.at(-1);
    const stack = rest.length > 1 ? rest[0] : undefined;
    const fields = { part, ...(typeof stack === 'string' ? { stack } : {}) };
    if (message instanceof Error) {
      this.logger[level]({ ...fields, err: message }, message.message);
    } else if (typeof message === 'object' && message !== null) {
      const { error, ...others } = message as Record<string, unknown>;
      this.logger[level]({ ...fields, ...others, ...(error === undefined ? {} : { err: error }) });
    } else {
      this.logger[level](fields, String(message));
    }
  }
}
