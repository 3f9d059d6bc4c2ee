// Types of postgres.mjs for the tests, which are TypeScript.
export function portIsFree(port: number, host?: string): Promise<boolean>;
export function freePort(): Promise<number>;
export function startPostgres(options: {
  dataDir: string;
  port: number;
  throwAway?: boolean;
}): Promise<{ url: string; folder: string; stop(): Promise<void> }>;
