// Runs one stand-in as a process of its own: settings from the environment, one ready line, a clean stop on a signal.
import { z } from 'zod';

/** @throws Error with a line for each bad setting */
export function readSettings<T>(shape: z.ZodType<T>): T {
  const parsed = shape.safeParse(process.env);
  if (parsed.success) return parsed.data;
  const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`);
  throw new Error(`These settings need attention:\n${lines.join('\n')}`);
}

export async function run(start: () => Promise<{ ready: string; close(): Promise<void> }>): Promise<void> {
  try {
    const running = await start();
    const stop = (): void => {
      running.close().then(
        () => process.exit(0),
        () => process.exit(1),
      );
    };
    process.once('SIGTERM', stop);
    process.once('SIGINT', stop);
    process.stdout.write(`${running.ready}\n`);
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    process.exit(1);
  }
}

export const portSetting = (otherwise: number): z.ZodType<number> =>
  z.coerce.number().int().min(0).max(65_535).default(otherwise);
