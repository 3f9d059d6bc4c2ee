// The object store's stand-in as a process of its own.
import { z } from 'zod';
import { portSetting, readSettings, run } from '../run';
import { startStorageFake } from './start';

const shape = z.object({
  HOST: z.string().min(1).default('127.0.0.1'),
  STORAGE_PORT: portSetting(4312),
  DATA_DIR: z.string().min(1).default('.data'),
  S3_ACCESS_KEY_ID: z.string().min(1),
  S3_SECRET_ACCESS_KEY: z.string().min(1),
  S3_BUCKET: z.string().min(3).optional(),
});

await run(async () => {
  const env = readSettings(shape);
  const fake = await startStorageFake({
    host: env.HOST,
    port: env.STORAGE_PORT,
    dataDir: env.DATA_DIR,
    accessKeyId: env.S3_ACCESS_KEY_ID,
    secretAccessKey: env.S3_SECRET_ACCESS_KEY,
    bucket: env.S3_BUCKET,
  });
  return { ready: `Storage stand-in ready at ${fake.url}`, close: () => fake.close() };
});
