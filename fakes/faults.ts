// Faults that a test asks a stand-in for: which call goes wrong, how, and how many times.
import { z } from 'zod';

const kinds = [
  'timeout_before',
  'timeout_after',
  'status',
  'slow',
  'late_answer',
  'malformed',
  'hang',
  'duplicate_webhook',
  'late_webhook',
  'reorder_webhooks',
  'fail_later',
] as const;

const faultRequest = z.strictObject({
  match: z.string().min(1),
  kind: z.enum(kinds),
  times: z.number().int().min(1).default(1),
  /** The status of the answer (HTTP or SMTP) for kind `status`. */
  code: z.number().int().min(400).max(599).optional(),
  /** How long the fault lasts or delays, in milliseconds. */
  ms: z.number().int().min(0).optional(),
  /** With kind `status`: the answer is remembered under its idempotency key, as if work had begun. */
  keep: z.boolean().default(false),
});

export type FaultKind = (typeof kinds)[number];
export type Fault = z.output<typeof faultRequest> & { readonly id: string; readonly left: number };

export interface Faults {
  /** @throws ZodError when the request is not a fault */
  add(request: unknown): Fault;
  list(): readonly Fault[];
  clear(): void;
  /** The first open fault of one of these kinds that fits one of the subjects; it is used up by one. */
  take(subjects: readonly string[], wanted: readonly FaultKind[]): Fault | null;
}

/** `*` stands for anything, `:name` for one path segment; a match without either must be equal. */
function matcher(match: string): RegExp {
  const pattern = match
    .split(/(\*|:[A-Za-z]\w*)/)
    .map((part) =>
      part === '*' ? '.*' : /^:[A-Za-z]/.test(part) ? '[^/]+' : part.replace(/[.+?^${}()|[\]\\]/g, '\\$&'),
    )
    .join('');
  return new RegExp(`^${pattern}$`, 'i');
}

export function createFaults(): Faults {
  const open: Fault[] = [];
  let count = 0;
  return {
    add: (request) => {
      const parsed = faultRequest.parse(request);
      count += 1;
      const fault = { ...parsed, id: `fault_${count}`, left: parsed.times };
      open.push(fault);
      return fault;
    },
    list: () => open.filter((fault) => fault.left > 0),
    clear: () => {
      open.length = 0;
    },
    take: (subjects, wanted) => {
      for (const [index, fault] of open.entries()) {
        if (fault.left < 1 || !wanted.includes(fault.kind)) continue;
        const pattern = matcher(fault.match);
        if (!subjects.some((subject) => pattern.test(subject))) continue;
        open[index] = { ...fault, left: fault.left - 1 };
        return fault;
      }
      return null;
    },
  };
}
