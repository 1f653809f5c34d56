import { createContext, useContext, useId, useMemo, type ReactNode } from 'react';
import { classNames } from './class-names.ts';

interface FieldLinks {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
  required: boolean;
}

const FieldContext = createContext<FieldLinks | null>(null);

/** What an input needs to belong to the Field around it; props given to the input itself win. */
export function useFieldLinks(own: { id?: string; 'aria-describedby'?: string }) {
  const field = useContext(FieldContext);
  if (field === null) return own;
  return {
    id: own.id ?? field.id,
    'aria-describedby': own['aria-describedby'] ?? field['aria-describedby'],
    'aria-invalid': field['aria-invalid'],
    'aria-required': field.required || undefined,
  };
}

export interface FieldProps {
  label: ReactNode;
  /** Written under the input: format, range, where to find the value. */
  hint?: ReactNode;
  error?: string | undefined;
  /** Most inputs are needed; the others say "optional". */
  optional?: boolean;
  /** Fixed id, so that an error summary can lead here; made up otherwise. */
  id?: string;
  className?: string;
  children: ReactNode;
}

/** Label, hint, one input and what is wrong with it, tied together for assistive technology. */
export function Field({ label, hint, error, optional, id, className, children }: FieldProps) {
  const ownId = useId();
  const inputId = id ?? ownId;
  const hintId = `${inputId}-hint`;
  const errorId = `${inputId}-error`;
  const links = useMemo(
    () => ({
      id: inputId,
      'aria-describedby':
        [hint ? hintId : null, error ? errorId : null].filter(Boolean).join(' ') || undefined,
      'aria-invalid': error ? (true as const) : undefined,
      required: !optional,
    }),
    [inputId, hint, hintId, error, errorId, optional],
  );
  return (
    <FieldContext value={links}>
      <div
        className={classNames(
          'flex flex-col gap-1',
          error && 'border-l-4 border-ink pl-3',
          className,
        )}
      >
        <label htmlFor={inputId} className="text-sm font-medium">
          {label}
          {/* The blank stands outside, or the label is read as one word with it. */}
          {optional && (
            <>
              {' '}
              <span className="font-normal text-ink-faint">(optional)</span>
            </>
          )}
        </label>
        {children}
        {/* Beneath, so that inputs side by side stand in line. */}
        {hint && (
          <p id={hintId} className="text-xs text-ink-faint">
            {hint}
          </p>
        )}
        {error && <FieldError id={errorId}>{error}</FieldError>}
      </div>
    </FieldContext>
  );
}

/** A fault at its place: a sign and words, no colour of its own. */
export function FieldError({ id, children }: { id: string; children: string }) {
  return (
    <p id={id} className="flex gap-2 text-sm font-medium">
      <span
        aria-hidden="true"
        className="mt-0.5 inline-flex size-4 shrink-0 items-center justify-center bg-ink text-2xs font-bold text-paper"
      >
        !
      </span>
      {children}
    </p>
  );
}
