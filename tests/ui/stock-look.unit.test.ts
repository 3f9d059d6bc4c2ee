// The stylesheet knows our scales and none of the stock ones: a stray `rounded-lg` or `bg-red-500` draws nothing.
import fs from 'node:fs/promises';
import path from 'node:path';
import { compile } from 'tailwindcss';
import { beforeAll, describe, expect, it } from 'vitest';
import config from '../../tailwind.config';

const UTILITIES_ONLY = "@tailwind utilities; @config 'tailwind.config.ts';";

let build: (candidates: string[]) => string;

beforeAll(async () => {
  const compiled = await compile(UTILITIES_ONLY, {
    base: process.cwd(),
    loadModule: async (id, base) => ({ path: path.join(base, id), base, module: config }),
    loadStylesheet: async (id, base) => ({
      path: id,
      base,
      content: await fs.readFile(path.join(base, id), 'utf8'),
    }),
  });
  build = compiled.build;
});

/** A class that means something adds a rule with its name. */
const draws = (name: string): boolean => build([name]).includes(`.${name.replaceAll(':', '\\:')}`);

describe('the Tailwind theme', () => {
  it.each([
    'bg-sheet',
    'text-ink-2',
    'border-line',
    'p-14',
    'gap-28',
    'text-h1',
    'rounded-cast',
    'font-display',
    'tablet:flex',
  ])('when %s is ours, then it draws', (name) => {
    expect(draws(name)).toBe(true);
  });

  it.each([
    'bg-red-500',
    'text-gray-700',
    'border-slate-200',
    'rounded-lg',
    'shadow-md',
    'shadow',
    'text-xl',
    'text-base',
    'p-5',
    'gap-3',
    'font-bold',
    'font-sans',
    'sm:flex',
    'md:flex',
    'blur-sm',
    'animate-spin',
    'max-w-lg',
  ])('when %s is stock, then it draws nothing', (name) => {
    expect(draws(name)).toBe(false);
  });
});
