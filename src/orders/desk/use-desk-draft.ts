// The answers given so far at the desk, kept in the browser so that a locked phone or a reload loses nothing.
import { useState } from 'react';
import { z } from 'zod';
import type { DeskAnswer, DeskAnswers } from '../view/desk-checks';

const draft = z.record(z.string(), z.enum(['yes', 'no']));
const keyOf = (orderId: string): string => `spragyard-desk-${orderId}`;

function stored(orderId: string): DeskAnswers {
  try {
    const parsed = draft.safeParse(JSON.parse(sessionStorage.getItem(keyOf(orderId)) ?? '{}'));
    return parsed.success ? parsed.data : {};
  } catch {
    return {};
  }
}

function store(orderId: string, answers: DeskAnswers): void {
  try {
    sessionStorage.setItem(keyOf(orderId), JSON.stringify(answers));
  } catch {
    // Nothing can be kept in a private window; the answers still hold until the page is left.
  }
}

export interface DeskDraft {
  readonly answers: DeskAnswers;
  readonly answer: (code: string, given: DeskAnswer) => void;
  /** Says yes to every check that is still open. */
  readonly restIsWell: (codes: readonly string[]) => void;
  readonly forget: () => void;
}

export function useDeskDraft(orderId: string): DeskDraft {
  const [answers, setAnswers] = useState<DeskAnswers>(() => stored(orderId));
  const change = (next: DeskAnswers) => {
    store(orderId, next);
    setAnswers(next);
  };
  return {
    answers,
    answer: (code, given) => change({ ...answers, [code]: given }),
    restIsWell: (codes) => {
      const well = Object.fromEntries(codes.map((code): [string, DeskAnswer] => [code, 'yes']));
      change({ ...well, ...answers });
    },
    forget: () => change({}),
  };
}
