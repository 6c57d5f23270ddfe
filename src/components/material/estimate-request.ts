import { AppError, type FieldError } from '#src/lib/errors.ts';
import type { EstimateRequestInput, EstimateResponse } from '#src/schemas/estimate.ts';

/** The part of a problem document (RFC 9457) that a reader is shown. */
interface ProblemBody {
  readonly detail?: unknown;
  readonly errors?: unknown;
}

function fieldErrors(errors: unknown): FieldError[] {
  if (!Array.isArray(errors)) return [];
  return errors.flatMap((entry: unknown) =>
    typeof entry === 'object' &&
    entry !== null &&
    'path' in entry &&
    'message' in entry &&
    typeof entry.path === 'string' &&
    typeof entry.message === 'string'
      ? [{ path: entry.path, message: entry.message }]
      : [],
  );
}

async function readProblem(response: Response): Promise<AppError> {
  const code =
    response.status === 422 ? 'UNPROCESSABLE' : response.status >= 500 ? 'UNAVAILABLE' : 'CONFLICT';
  try {
    const body = (await response.json()) as ProblemBody;
    if (typeof body.detail === 'string') {
      return new AppError(code, body.detail, { fields: fieldErrors(body.errors) });
    }
  } catch {
    // Not a problem document: a proxy answered. The status is all that is known.
  }
  return new AppError(code, `The server answered with status ${response.status}. Try again in a minute.`);
}

/** Asks the server for an estimate. Throws AppError with the server's own sentences when it refuses. */
export async function fetchEstimate(
  request: EstimateRequestInput,
  signal: AbortSignal,
): Promise<EstimateResponse> {
  let response: Response;
  try {
    response = await fetch('/api/v1/estimates', {
      method: 'POST',
      headers: { 'content-type': 'application/json', accept: 'application/json' },
      body: JSON.stringify(request),
      signal,
    });
  } catch (error) {
    if (signal.aborted) throw error;
    throw new AppError('UNAVAILABLE', 'The server cannot be reached. Check the connection and try again.', {
      cause: error,
    });
  }
  if (!response.ok) throw await readProblem(response);
  // The contract of the same build stands behind this answer.
  return (await response.json()) as EstimateResponse;
}
