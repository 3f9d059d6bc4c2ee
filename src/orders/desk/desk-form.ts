// From the desk to the grade that is sent: what is still wanting, and the deductions with their photos.
import type { FieldError } from '../../../shared/kernel/problem';
import type { ActionInput } from '../../../shared/orders/actions';
import type { OrderPhoto } from '../photos/use-photo-uploads';
import type { DeskResult } from '../view/desk-checks';

type PhotoOf = (code: string) => OrderPhoto | undefined;

const nameOf = (code: string): string => `check-${code}`;

/** What stands between the answers and a grade: open checks, and deductions without a photo. */
export function deskFaults(result: DeskResult, photoOf: PhotoOf): FieldError[] {
  return [
    ...result.open.map((check) => ({ path: nameOf(check.code), message: 'Say yes or no' })),
    ...result.lines
      .filter((line) => !photoOf(line.code))
      .map((line) => ({ path: nameOf(line.code), message: 'Take a photo that shows it' })),
  ];
}

export function gradeInput(
  version: number,
  result: DeskResult,
  photoOf: PhotoOf,
  note: string,
): ActionInput<'grade'> {
  return {
    version,
    grade: result.grade,
    deductions: result.lines.map((line) => ({ code: line.code, photoId: photoOf(line.code)?.id ?? '' })),
    ...(note.trim() ? { note: note.trim() } : {}),
  };
}
