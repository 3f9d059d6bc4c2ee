// The payments stand-in as a process of its own.
import { z } from 'zod';
import { portSetting, readSettings, run } from '../run';
import { startPaymentsFake } from './start';

const shape = z.object({
  HOST: z.string().min(1).default('127.0.0.1'),
  PAYMENTS_PORT: portSetting(4311),
  DATA_DIR: z.string().min(1).default('.data'),
  STRIPE_SECRET_KEY: z.string().min(8),
  STRIPE_WEBHOOK_SECRET: z.string().min(8),
  WEBHOOK_URL: z.url().optional(),
  FEE_BPS: z.coerce.number().int().min(0).max(10_000).default(0),
  AVAILABLE_DELAY_MS: z.coerce.number().int().min(0).default(0),
  STRICT_EXPIRY: z.enum(['0', '1']).default('0'),
});

await run(async () => {
  const env = readSettings(shape);
  const fake = await startPaymentsFake({
    host: env.HOST,
    port: env.PAYMENTS_PORT,
    dataDir: env.DATA_DIR,
    secretKey: env.STRIPE_SECRET_KEY,
    webhookSecret: env.STRIPE_WEBHOOK_SECRET,
    webhookUrl: env.WEBHOOK_URL,
    feeBps: env.FEE_BPS,
    availableDelayMs: env.AVAILABLE_DELAY_MS,
    strictExpiry: env.STRICT_EXPIRY === '1',
  });
  return { ready: `Payments stand-in ready at ${fake.url}`, close: () => fake.close() };
});
