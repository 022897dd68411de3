import { availableParallelism } from 'node:os';

import { z } from 'zod';

const onOff = z.enum(['on', 'off']).transform((value) => value === 'on');

const origin = z
  .string()
  .refine((text) => URL.canParse(text) && /^https?:$/.test(new URL(text).protocol), {
    message: 'Write origins like https://holdfast.example.org, separated by commas.',
  })
  .transform((text) => new URL(text).origin);

const environment = z.object({
  NODE_ENV: z.string().default('development'),
  HOST: z.string().min(1).default('127.0.0.1'),
  PORT: z.coerce.number().int().min(0).max(65_535).default(4310),
  HOLDFAST_DATABASE_URL: z.string().regex(/^postgres(ql)?:\/\//, 'Write a postgres:// address.'),
  HOLDFAST_DATABASE_CONNECTIONS: z.coerce.number().int().min(2).max(200).default(12),
  HOLDFAST_DEMO: onOff.default(true),
  HOLDFAST_SESSION_SECRET: z.string().min(32, 'Use at least 32 characters.'),
  HOLDFAST_PUBLIC_ORIGINS: z
    .string()
    .transform((text) => text.split(',').map((part) => part.trim()))
    .pipe(z.array(origin))
    .optional(),
  HOLDFAST_WORKER_THREADS: z.coerce.number().int().min(1).max(256).optional(),
  HOLDFAST_LOG_LEVEL: z
    .enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent'])
    .default('info'),
  HOLDFAST_TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
});

/** Token of the {@link AppConfig}: `@Inject(APP_CONFIG) config: AppConfig`. */
export const APP_CONFIG = Symbol('APP_CONFIG');

/** The settings of one running server, read from the environment once. */
export interface AppConfig {
  readonly isProduction: boolean;
  readonly host: string;
  readonly port: number;
  readonly databaseUrl: string;
  /** Upper limit of connections to PostgreSQL. */
  readonly databaseConnections: number;
  /** Whether an empty database is filled with the demo workspace. */
  readonly isDemo: boolean;
  /** Key of everything that is signed: session cookies, known browsers. */
  readonly sessionSecret: string;
  /** Origins that pages of this server are opened at. */
  readonly publicOrigins: readonly string[];
  readonly workerThreads: number;
  readonly logLevel: 'fatal' | 'error' | 'warn' | 'info' | 'debug' | 'trace' | 'silent';
  /** How many proxies in front of the server to believe about address and protocol. */
  readonly trustedProxies: number;
}

/** The environment can't be used; the message names each variable and what it should be. */
export class ConfigurationError extends Error {
  constructor(issues: readonly z.core.$ZodIssue[]) {
    const lines = issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
    super(`The environment is not complete:\n${lines.join('\n')}`);
    this.name = 'ConfigurationError';
  }
}

/**
 * Reads the settings.
 * @throws {ConfigurationError} when a variable is missing or can't be read
 */
export function readConfig(env: NodeJS.ProcessEnv): AppConfig {
  const parsed = environment.safeParse(env);
  if (!parsed.success) {
    throw new ConfigurationError(parsed.error.issues);
  }
  const { data } = parsed;
  return {
    isProduction: data.NODE_ENV === 'production',
    host: data.HOST,
    port: data.PORT,
    databaseUrl: data.HOLDFAST_DATABASE_URL,
    databaseConnections: data.HOLDFAST_DATABASE_CONNECTIONS,
    isDemo: data.HOLDFAST_DEMO,
    sessionSecret: data.HOLDFAST_SESSION_SECRET,
    publicOrigins: data.HOLDFAST_PUBLIC_ORIGINS ?? [
      `http://${data.HOST}:${data.PORT}`,
      `http://localhost:${data.PORT}`,
    ],
    workerThreads: data.HOLDFAST_WORKER_THREADS ?? availableParallelism(),
    logLevel: data.HOLDFAST_LOG_LEVEL,
    trustedProxies: data.HOLDFAST_TRUST_PROXY,
  };
}
