// The only reader of process.env: every setting is parsed once, and each bad or unknown one is named before anything starts.
import { z } from 'zod';

const port = z.coerce.number().int().min(0).max(65_535);
const flag = z.enum(['0', '1', 'true', 'false', '']).transform((value) => value === '1' || value === 'true');

const schema = z.object({
  NODE_ENV: z.enum(['development', 'test', 'production']).default('development'),
  PORT: port.default(4310),
  HOST: z.string().min(1).default('127.0.0.1'),
  DATA_DIR: z.string().min(1).default('.data'),
  DATABASE_URL: z.url({ protocol: /^postgres(ql)?$/ }),
  DATABASE_POOL: z.coerce.number().int().min(2).max(100).default(10),
  PG_PORT: port.default(54_310),
  PAYMENTS_PORT: port.default(4311),
  STORAGE_PORT: port.default(4312),
  MAIL_PORT: port.default(4313),
  MAIL_WEB_PORT: port.default(4314),
  DEMO: flag.default(false),
  SESSION_SECRET: z.string().min(32, 'must have at least 32 characters'),
  STRIPE_SECRET_KEY: z.string().min(8),
  STRIPE_WEBHOOK_SECRET: z.string().min(8),
  STRIPE_HOST: z.url().optional(),
  S3_ENDPOINT: z.url().optional(),
  S3_REGION: z.string().default('us-east-1'),
  S3_BUCKET: z.string().min(3),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  SMTP_URL: z.url({ protocol: /^smtps?$/ }),
  MAIL_FROM: z.string().default('Spragyard <notices@spragyard.example>'),
  PUBLIC_URL: z.url(),
  /** Multiplies every rate limit; for load tests on this machine. */
  RATE_LIMIT_FACTOR: z.coerce.number().int().min(1).max(1000).default(1),
  TRUST_PROXY: z.coerce.number().int().min(0).max(5).default(0),
  LOG_LEVEL: z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).default('info'),
});

export type Env = Readonly<z.output<typeof schema>>;

const OURS = /^(SPRAGYARD_|STRIPE_|S3_|SMTP_|PAYMENTS_|STORAGE_|MAIL_|PG_PORT|SESSION_|DATABASE_)/;

/**
 * Parses the settings.
 * @throws Error whose message has a line for each bad, missing or unknown setting
 */
export function parseEnv(source: Readonly<Record<string, string | undefined>>): Env {
  const lines: string[] = [];
  for (const key of Object.keys(source)) {
    if (OURS.test(key) && !(key in schema.shape)) lines.push(`${key}: no such setting`);
  }
  const parsed = schema.safeParse(source);
  if (!parsed.success) {
    for (const issue of parsed.error.issues) lines.push(`${issue.path.join('.')}: ${issue.message}`);
  }
  if (lines.length > 0 || !parsed.success) {
    throw new Error(`These settings need attention:\n${lines.map((text) => `  ${text}`).join('\n')}`);
  }
  return parsed.data;
}

export const readEnv = (): Env => parseEnv(process.env);
