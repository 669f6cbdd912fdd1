import { z } from 'zod';

const LOOPBACK = new Set(['localhost', '127.0.0.1', '[::1]']);

/** Whether this address cannot leave the machine: browsers then trust plain http as they trust https. */
export function isLoopback(url: URL): boolean {
  return LOOPBACK.has(url.hostname);
}

const environmentSchema = z.object({
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  /** Where browsers find the app. Over http only on loopback: the sign-in cookie goes over nothing weaker. */
  APP_URL: z
    .url({ protocol: /^https?$/ })
    .refine((url) => url.startsWith('https:') || isLoopback(new URL(url)), 'https, unless it is on loopback'),
  /** 0: any free port, which the line `listening <port>` then names. */
  PORT: z.coerce.number().int().min(0).max(65_535),
  HOST: z.string().min(1).default('127.0.0.1'),
  JWT_SECRET: z.string().min(32),
  /** The exported web app. Absent: the API alone. */
  WEB_DIR: z.string().min(1).optional(),
  NODE_ENV: z.enum(['development', 'test', 'production']).default('production'),
  LOG_LEVEL: z.enum(['silent', 'error', 'warn', 'info', 'debug']).default('info'),
  /** Addresses of proxies whose word on who calls is taken, as Express reads them; none unless said. */
  TRUST_PROXY: z.string().min(1).optional(),
});

export interface Config {
  databaseUrl: string;
  appUrl: URL;
  port: number;
  host: string;
  jwtSecret: string;
  webDir: string | null;
  logLevel: z.output<typeof environmentSchema>['LOG_LEVEL'];
  trustProxy: string | null;
}

/**
 * Reads the environment.
 * @throws Error that names every variable that is missing or wrong, and none of their values
 */
export function readConfig(environment: NodeJS.ProcessEnv): Config {
  const read = environmentSchema.safeParse(environment);
  if (!read.success) {
    const wrong = read.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`The environment is not what the server needs.\n${wrong.join('\n')}`);
  }
  const env = read.data;
  return {
    databaseUrl: env.DATABASE_URL,
    appUrl: new URL(env.APP_URL),
    port: env.PORT,
    host: env.HOST,
    jwtSecret: env.JWT_SECRET,
    webDir: env.WEB_DIR ?? null,
    logLevel: env.LOG_LEVEL,
    trustProxy: env.TRUST_PROXY ?? null,
  };
}
