const paths = {
  close: 'M3.5 3.5l9 9M12.5 3.5l-9 9',
  check: 'M3 8.5l3.5 3.5L13 4.5',
  dash: 'M3.5 8h9',
  'chevron-down': 'M3.5 6l4.5 4.5L12.5 6',
  'chevron-left': 'M10 3.5L5.5 8l4.5 4.5',
  'chevron-right': 'M6 3.5L10.5 8L6 12.5',
  ascending: 'M4 10l4-4.5L12 10',
  descending: 'M4 6l4 4.5L12 6',
  search: 'M7 11.5a4.5 4.5 0 1 0 0-9a4.5 4.5 0 0 0 0 9zM10.3 10.3L14 14',
  more: 'M3.5 8h.01M8 8h.01M12.5 8h.01',
  plus: 'M8 3v10M3 8h10',
  upload: 'M8 10.5V3M4.8 6L8 2.8L11.2 6M2.5 10.5v3h11v-3',
  download: 'M8 2.5V10M4.8 7L8 10.2L11.2 7M2.5 10.5v3h11v-3',
  light: 'M8 11a3 3 0 1 0 0-6a3 3 0 0 0 0 6zM8 1.5v1.7M8 12.8v1.7M1.5 8h1.7M12.8 8h1.7',
  dark: 'M13 9.8A5.6 5.6 0 0 1 6.2 3a5.6 5.6 0 1 0 6.8 6.8z',
  system: 'M2 3h12v8H2zM6 13.5h4',
  folder: 'M1.8 12.8V3.5h4.5l1.6 1.8h6.3v7.5z',
  file: 'M3.5 1.8h5.7l3.3 3.4v9h-9zM9 1.8v3.6h3.5',
  help: 'M5.7 6a2.3 2.3 0 1 1 3.4 2c-.8.4-1.1.9-1.1 1.8M8 12.3h.01',
  retry: 'M12.8 8A4.8 4.8 0 1 1 11 4.2M11.3 1.8v2.7H8.6',
} as const;

export type IconName = keyof typeof paths;

/** A line drawing beside a word or inside a named button; never the only carrier of a meaning. */
export function Icon({ name, size = 16 }: { name: IconName; size?: number }) {
  return (
    <svg
      aria-hidden="true"
      className="shrink-0"
      width={size}
      height={size}
      viewBox="0 0 16 16"
      fill="none"
      stroke="currentColor"
      strokeWidth={name === 'more' ? 2.2 : 1.4}
      strokeLinecap="square"
    >
      <path d={paths[name]} />
    </svg>
  );
}
