// Keeps a stand-in's state on disk: every change is appended before it is answered, so a killed process loses nothing.
import {
  closeSync,
  existsSync,
  mkdirSync,
  openSync,
  readFileSync,
  renameSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';

/** One kind of record by id, in the order in which the records were first put. */
export interface Table<T> {
  get(id: string): T | undefined;
  put(id: string, value: T): T;
  remove(id: string): void;
  all(): T[];
}

export interface Journal {
  /** Each table is asked for once, before the first change. */
  table<T>(name: string, shape: z.ZodType<T>): Table<T>;
  /** Appends what changed since the last call, as one line: all of it is there after a crash, or none. */
  flush(): void;
  close(): void;
}

type Change = [table: string, id: string, value: unknown];

const savedLine = z.array(z.tuple([z.string(), z.string(), z.unknown()]));

function readChanges(file: string): Change[] {
  if (!existsSync(file)) return [];
  const changes: Change[] = [];
  for (const line of readFileSync(file, 'utf8').split('\n')) {
    if (line === '') continue;
    const parsed = savedLine.safeParse(tryJson(line));
    // Only the last line can be torn, by a crash in the middle of a write that nobody was answered for.
    if (!parsed.success) break;
    changes.push(...parsed.data);
  }
  return changes;
}

function tryJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

/** The last value of each record, in the order of their first appearance. */
function settle(changes: readonly Change[]): Map<string, Map<string, unknown>> {
  const tables = new Map<string, Map<string, unknown>>();
  for (const [name, id, value] of changes) {
    const rows = tables.get(name) ?? new Map<string, unknown>();
    if (value === null) rows.delete(id);
    else rows.set(id, value);
    tables.set(name, rows);
  }
  return tables;
}

function rewrite(file: string, tables: Map<string, Map<string, unknown>>): void {
  const lines: string[] = [];
  for (const [name, rows] of tables) {
    for (const [id, value] of rows) lines.push(`${JSON.stringify([[name, id, value]])}\n`);
  }
  writeFileSync(`${file}.new`, lines.join(''));
  renameSync(`${file}.new`, file);
}

/** @param directory where the journal lives; without one everything stays in memory */
export function openJournal(directory?: string): Journal {
  const file = directory === undefined ? null : join(directory, 'journal.jsonl');
  if (directory !== undefined) mkdirSync(directory, { recursive: true });
  const saved = file === null ? new Map<string, Map<string, unknown>>() : settle(readChanges(file));
  if (file !== null) rewrite(file, saved);
  const handle = file === null ? null : openSync(file, 'a');
  let waiting: Change[] = [];

  const flush = (): void => {
    if (waiting.length > 0 && handle !== null) writeSync(handle, `${JSON.stringify(waiting)}\n`);
    waiting = [];
  };

  return {
    flush,
    table: (name, shape) => {
      const rows = new Map(Array.from(saved.get(name) ?? [], ([id, value]) => [id, shape.parse(value)]));
      const note = (id: string, value: unknown): void => {
        if (handle !== null) waiting.push([name, id, value]);
      };
      return {
        get: (id) => rows.get(id),
        put: (id, value) => {
          rows.set(id, value);
          note(id, value);
          return value;
        },
        remove: (id) => {
          if (rows.delete(id)) note(id, null);
        },
        all: () => Array.from(rows.values()),
      };
    },
    close: () => {
      flush();
      if (handle !== null) closeSync(handle);
    },
  };
}
