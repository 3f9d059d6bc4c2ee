// The mail stand-in as a process of its own.
import { z } from 'zod';
import { portSetting, readSettings, run } from '../run';
import { startMailFake } from './start';

const shape = z.object({
  HOST: z.string().min(1).default('127.0.0.1'),
  MAIL_PORT: portSetting(4313),
  MAIL_WEB_PORT: portSetting(4314),
  DATA_DIR: z.string().min(1).default('.data'),
});

await run(async () => {
  const env = readSettings(shape);
  const fake = await startMailFake({
    host: env.HOST,
    smtpPort: env.MAIL_PORT,
    webPort: env.MAIL_WEB_PORT,
    dataDir: env.DATA_DIR,
  });
  return { ready: `Mail stand-in ready at ${fake.smtpUrl}, inbox at ${fake.url}`, close: () => fake.close() };
});
