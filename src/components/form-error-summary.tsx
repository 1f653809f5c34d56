import { useEffect, useRef } from 'react';

export interface FormFault {
  /** Id of the input; absent where the fault belongs to the form as a whole. */
  inputId?: string;
  message: string;
}

/** All faults of a form on top of it, each leading to its input. Takes the focus when faults appear. */
export function FormErrorSummary({
  faults,
  title = 'Please mend this and send again.',
}: {
  faults: readonly FormFault[];
  title?: string;
}) {
  const box = useRef<HTMLDivElement>(null);
  const any = faults.length > 0;
  useEffect(() => {
    if (any) box.current?.focus();
  }, [any]);
  if (!any) return null;
  return (
    <div ref={box} role="alert" tabIndex={-1} className="border-2 border-ink bg-sheet p-3 text-sm">
      <p className="font-semibold">{title}</p>
      <ul className="mt-1 list-disc pl-5">
        {faults.map((fault) => (
          <li key={`${fault.inputId ?? ''} ${fault.message}`}>
            {fault.inputId === undefined ? (
              fault.message
            ) : (
              <a
                className="ink-link"
                href={`#${fault.inputId}`}
                onClick={(event) => {
                  event.preventDefault();
                  document.getElementById(fault.inputId ?? '')?.focus();
                }}
              >
                {fault.message}
              </a>
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
