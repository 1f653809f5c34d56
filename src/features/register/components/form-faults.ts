import type { FieldErrors } from 'react-hook-form';
import type { FormFault } from '#src/components/form-error-summary.tsx';
import type { ApiError } from '#src/lib/api-error.ts';

/** What the form found and what the server refused, as one list; inputs carry their field's name as id. */
export function faultsOf(errors: FieldErrors, failure: ApiError | null): FormFault[] {
  const own = Object.entries(errors).flatMap(([name, error]) =>
    typeof error?.message === 'string' ? [{ inputId: name, message: error.message }] : [],
  );
  if (own.length > 0 || failure === null) return own;
  if (failure.fields.length === 0) return [{ message: failure.message }];
  return failure.fields.map((fault) =>
    fault.path === ''
      ? { message: fault.message }
      : { inputId: fault.path, message: fault.message },
  );
}

/** What is wrong at one input: what the form found, else what the server refused. */
export function faultAt(
  name: string,
  errors: FieldErrors,
  failure: ApiError | null,
): string | undefined {
  const own = errors[name]?.message;
  if (typeof own === 'string') return own;
  return failure?.fields.find(({ path }) => path === name)?.message;
}
