import { z } from 'zod';

const environmentSchema = z.object({
  PORT: z.coerce.number().int().min(0).max(65535).default(4280),
  /** Loopback unless said otherwise: the demonstration's passwords are no secret. */
  HOST: z.string().min(1).default('127.0.0.1'),
  DATA_DIR: z.string().min(1).default('data'),
  CLIENT_DIR: z.string().min(1).default('dist/client'),
  LOG_LEVEL: z.enum(['silent', 'fatal', 'error', 'warn', 'info', 'debug', 'trace']).default('warn'),
  TRUST_PROXY: z.coerce.number().int().min(0).max(10).default(0),
});

export interface Environment {
  port: number;
  host: string;
  dataDirectory: string;
  clientDirectory: string;
  logLevel: string;
  trustedProxies: number;
}

/** Settings from environment variables; throws an error that names every variable that cannot be used. */
export function readEnvironment(variables: NodeJS.ProcessEnv): Environment {
  const result = environmentSchema.safeParse(variables);
  if (!result.success) {
    const problems = result.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`);
    throw new Error(`Unusable environment variables\n${problems.join('\n')}`);
  }
  const { PORT, HOST, DATA_DIR, CLIENT_DIR, LOG_LEVEL, TRUST_PROXY } = result.data;
  return {
    port: PORT,
    host: HOST,
    dataDirectory: DATA_DIR,
    clientDirectory: CLIENT_DIR,
    logLevel: LOG_LEVEL,
    trustedProxies: TRUST_PROXY,
  };
}
