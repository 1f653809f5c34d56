import type { ReactNode } from 'react';
import { classNames } from './class-names.ts';

/**
 * The joint marks show a ring on its seat: sitting, parted by a hairline, lifted and tilted, or not
 * to be seen. The box marks show how far a piece of work has come.
 */
const drawings = {
  sitting: (
    <>
      <path d="M3 4.5h10v6H3z" fill="none" />
      <path d="M1 11.5h14" strokeWidth="2" />
    </>
  ),
  parted: (
    <>
      <path d="M3 2.5h10v6H3z" fill="none" />
      <path d="M3 5.5h10" />
      <path d="M1 12.5h14" strokeWidth="2" />
    </>
  ),
  lifted: (
    <>
      <path d="M2.6 3.9L12.4 1l1.7 5.8L4.3 9.7z" fill="currentColor" />
      <path d="M1 13.5h14" strokeWidth="2" />
    </>
  ),
  unseen: (
    <>
      <path d="M3 3.5h10v6H3z" fill="none" strokeDasharray="2 2" />
      <path d="M1 12.5h14" strokeWidth="2" strokeDasharray="3 2.5" />
    </>
  ),
  'box-empty': <path d="M2.5 2.5h11v11h-11z" fill="none" />,
  'box-quarter': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="none" />
      <path d="M2.5 8H8v5.5H2.5z" fill="currentColor" />
    </>
  ),
  'box-half': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="none" />
      <path d="M2.5 8h11v5.5h-11z" fill="currentColor" />
    </>
  ),
  'box-dot': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="none" />
      <path d="M6.5 6.5h3v3h-3z" fill="currentColor" />
    </>
  ),
  'box-diagonal': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="none" />
      <path d="M2.5 13.5l11-11v11z" fill="currentColor" />
    </>
  ),
  'box-check': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="currentColor" />
      <path d="M4.8 8.2l2.3 2.4l4.3-5" stroke="var(--tone-paper)" strokeWidth="1.6" fill="none" />
    </>
  ),
  'box-struck': (
    <>
      <path d="M2.5 2.5h11v11h-11z" fill="none" />
      <path d="M1 8h14" strokeWidth="1.8" />
    </>
  ),
} as const;

export type MarkShape = keyof typeof drawings;
export type MarkTone = 'ink' | 'faint' | 'evidence' | 'fit';

const tones: Record<MarkTone, string> = {
  ink: 'text-ink',
  faint: 'text-ink-soft',
  evidence: 'text-evidence',
  fit: 'text-fit',
};

/** A shape and a word for a state; the colour only repeats what both say. */
export function StateMark({
  shape,
  tone = 'ink',
  children,
  strong = false,
}: {
  shape: MarkShape;
  tone?: MarkTone;
  children: ReactNode;
  strong?: boolean;
}) {
  return (
    <span
      className={classNames(
        'inline-flex items-center gap-1.5 text-sm whitespace-nowrap',
        tones[tone],
        strong && 'font-semibold',
      )}
    >
      <svg
        aria-hidden="true"
        width="16"
        height="16"
        viewBox="0 0 16 16"
        stroke="currentColor"
        strokeWidth="1.2"
        className="shrink-0"
      >
        {drawings[shape]}
      </svg>
      {children}
    </span>
  );
}
