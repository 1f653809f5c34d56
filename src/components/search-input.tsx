import { useEffect, useRef, useState } from 'react';
import { classNames } from './class-names.ts';
import { Icon } from './icon.tsx';
import { inputStyle } from './input-style.ts';

/** Tells of a new search text once typing rests, so that a list asks the server once a word. */
export function SearchInput({
  label,
  value,
  onSearch,
  placeholder,
  delayMs = 250,
  className,
}: {
  label: string;
  value: string;
  onSearch: (text: string) => void;
  placeholder?: string;
  delayMs?: number;
  className?: string;
}) {
  const [text, setText] = useState(value);
  const [given, setGiven] = useState(value);
  // A new value from outside (the address, a reset) replaces what stands in the box.
  if (value !== given) {
    setGiven(value);
    setText(value);
  }
  const latest = useRef(onSearch);
  useEffect(() => {
    latest.current = onSearch;
  }, [onSearch]);
  useEffect(() => {
    if (text === value) return;
    const timer = setTimeout(() => latest.current(text), delayMs);
    return () => clearTimeout(timer);
  }, [text, value, delayMs]);
  return (
    <span className={classNames('relative block', className)}>
      <span className="pointer-events-none absolute inset-y-0 left-2.5 flex items-center text-ink-soft">
        <Icon name="search" />
      </span>
      <input
        type="search"
        aria-label={label}
        placeholder={placeholder}
        value={text}
        onChange={(event) => setText(event.target.value)}
        className={classNames(inputStyle, 'pl-8')}
      />
    </span>
  );
}
