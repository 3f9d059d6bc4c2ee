// Something could not be read: what happened in the server's words, a way to try again, and the number to quote.
import { RotateCw } from 'lucide-react';
import type { ReactNode } from 'react';
import { OfflineError, ProblemError } from '../http/client';
import { Button } from './button';
import { StopBox } from './stop-box';

export interface ErrorWords {
  readonly title: string;
  readonly detail: string;
  readonly requestId?: string;
}

/** What an error says to a person. A stranger's error text is never shown. */
export function errorWords(error: unknown): ErrorWords {
  if (error instanceof ProblemError) {
    const { title, detail, requestId } = error.problem;
    return { title, detail: detail ?? 'Try again in a moment.', ...(requestId ? { requestId } : {}) };
  }
  if (error instanceof OfflineError) return { title: 'No answer', detail: error.message };
  return { title: 'This could not be shown', detail: 'Try again. If it stays, load the page again.' };
}

interface ErrorStateProps {
  readonly error: unknown;
  readonly onRetry?: () => void;
  /** Another way on, when trying again is no use. */
  readonly actions?: ReactNode;
}

export function ErrorState({ error, onRetry, actions }: ErrorStateProps) {
  const { title, detail, requestId } = errorWords(error);
  return (
    <div className="grid content-start gap-14">
      <StopBox title={title} announce>
        <p>{detail}</p>
        {requestId && (
          <p className="xs">
            Request <span className="code">{requestId}</span>
          </p>
        )}
      </StopBox>
      {(onRetry || actions) && (
        <div className="state-actions">
          {onRetry && (
            <Button icon={RotateCw} onClick={onRetry}>
              Try again
            </Button>
          )}
          {actions}
        </div>
      )}
    </div>
  );
}
