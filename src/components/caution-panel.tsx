/** What can hurt people, where the work is planned. Bars at both sides, as on a guarded machine. */
export function CautionPanel({
  title = 'Before opening the machine',
  cautions,
}: {
  title?: string;
  cautions: readonly string[];
}) {
  if (cautions.length === 0) return null;
  return (
    <section aria-label={`Caution: ${title}`} className="flex border border-ink bg-sheet">
      <div
        aria-hidden="true"
        className="w-3 shrink-0 bg-[repeating-linear-gradient(-45deg,var(--tone-ink)_0_5px,transparent_5px_10px)]"
      />
      <div className="px-4 py-3">
        <h3 className="text-sm font-bold">
          <span className="mr-2 bg-ink px-1.5 py-0.5 text-paper">Caution</span>
          {title}
        </h3>
        <ul className="mt-2 flex list-disc flex-col gap-1 pl-5 text-sm">
          {cautions.map((caution) => (
            <li key={caution}>{caution}</li>
          ))}
        </ul>
      </div>
    </section>
  );
}
