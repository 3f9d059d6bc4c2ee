// A warning on the console fails the test it came from, so that none piles up unseen.
import { afterEach, beforeEach, expect } from 'vitest';

const heard: string[] = [];
const original = { error: console.error, warn: console.warn };

beforeEach(() => {
  heard.length = 0;
  for (const level of ['error', 'warn'] as const) {
    console[level] = (...words: unknown[]) => {
      heard.push(words.map(String).join(' ').slice(0, 400));
      original[level](...words);
    };
  }
});

afterEach(() => {
  Object.assign(console, original);
  expect(heard, 'something was written to the console').toEqual([]);
});
