/** The name with its sign: a run of lines on a seat that has come apart. */
export function ProductMark() {
  return (
    <span className="inline-flex items-center gap-2">
      <svg
        aria-hidden="true"
        width="26"
        height="24"
        viewBox="0 0 26 24"
        stroke="currentColor"
        className="shrink-0"
      >
        <path d="M1 16.5h24" strokeWidth="2" />
        <path d="M4 16V2M9.5 16V7M15 16v-6M20.5 16v-3.5" strokeWidth="2.4" />
        <path d="M1 21h13M17 22.5h8" strokeWidth="2" />
      </svg>
      <span className="text-lg font-bold tracking-tight [font-stretch:112%]">Fretline</span>
    </span>
  );
}
