/** The look shared by everything one types or picks in. */
export const inputStyle =
  'min-h-9 w-full min-w-0 rounded-sm border border-rule bg-sheet px-2.5 py-1 text-base text-ink ' +
  'placeholder:text-ink-faint hover:border-ink aria-invalid:border-2 aria-invalid:border-ink ' +
  'disabled:cursor-not-allowed disabled:bg-well disabled:text-ink-faint disabled:hover:border-rule';
