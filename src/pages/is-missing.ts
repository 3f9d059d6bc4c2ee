// Nothing at this address, or not the asker's to see: the server answers both alike.
import { ProblemError } from '../http/client';

export const isMissing = (error: unknown): boolean =>
  error instanceof ProblemError && error.problem.status === 404;
