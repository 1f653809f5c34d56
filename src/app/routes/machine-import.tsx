import {
  keepPreviousData,
  useQuery,
  useSuspenseQuery,
  type QueryClient,
} from '@tanstack/react-query';
import { useNavigate, useParams, type LoaderFunctionArgs } from 'react-router-dom';
import {
  importListQuery as importListContract,
  importRowsQuery as importRowsContract,
  rowFates,
} from '#shared/contracts/register-import.ts';
import { ButtonLink } from '#src/components/button-link.tsx';
import { EmptyState } from '#src/components/empty-state.tsx';
import { PageHeader } from '#src/components/page-header.tsx';
import { Pager } from '#src/components/pager.tsx';
import { ProgressBar } from '#src/components/progress-bar.tsx';
import { Select } from '#src/components/select.tsx';
import { StateMark } from '#src/components/state-mark.tsx';
import {
  importListQuery,
  importQuery,
  importRowsQuery,
} from '#src/features/register-import/api/imports.ts';
import { ExportPanel } from '#src/features/register-import/components/export-panel.tsx';
import { FateTable } from '#src/features/register-import/components/fate-table.tsx';
import { ImportActions } from '#src/features/register-import/components/import-actions.tsx';
import { ImportTable } from '#src/features/register-import/components/import-table.tsx';
import {
  fateWords,
  kindWords,
  stateShapes,
  stateWords,
} from '#src/features/register-import/components/import-words.ts';
import { SendFilePanel } from '#src/features/register-import/components/send-file-panel.tsx';
import { formatInstant } from '#src/lib/dates.ts';
import { readListQuery, useListAddress } from '../list-address.ts';
import { useSite } from '../site-context.ts';

const machinesCrumb = (siteId: number) => ({
  label: 'Machines',
  to: `/sites/${siteId}/machines`,
});

/** The register out as files, and for the lead into it from files. */
export function MachineImportPage() {
  const { siteId, role } = useSite();
  const navigate = useNavigate();
  const mayImport = role === 'lead';
  const title = mayImport ? 'Import and export' : 'Export';
  return (
    <>
      <PageHeader title={title} crumbs={[machinesCrumb(siteId), { label: title }]} />
      {role === 'owner' ? (
        <EmptyState title="The register is not yours to export">
          Analysts and the reliability lead export it; you see your machines in the list.
        </EmptyState>
      ) : (
        <div className="grid items-start gap-5 grid-cols-[repeat(auto-fit,minmax(min(100%,26rem),1fr))]">
          {mayImport && (
            <SendFilePanel siteId={siteId} onSent={({ id }) => void navigate(String(id))} />
          )}
          <ExportPanel siteId={siteId} />
        </div>
      )}
      {mayImport && <EarlierImports siteId={siteId} />}
    </>
  );
}

function EarlierImports({ siteId }: { siteId: number }) {
  const { search, set } = useListAddress();
  const query = readListQuery(importListContract, search);
  const { data, isFetching } = useQuery({
    ...importListQuery(siteId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  return (
    <section aria-labelledby="earlier-imports" className="mt-6">
      <h2 id="earlier-imports" className="mb-2 text-lg">
        Earlier imports
      </h2>
      <ImportTable
        siteId={siteId}
        rows={data?.items ?? []}
        fetching={isFetching}
        empty={<EmptyState title="No imports yet">Each file that is sent is kept here.</EmptyState>}
      />
      {data && data.total > data.pageSize && (
        <Pager
          noun="imports"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
        />
      )}
    </section>
  );
}

export const importLoader =
  (queryClient: QueryClient) =>
  async ({ params }: LoaderFunctionArgs) => {
    await queryClient.ensureQueryData(importQuery(Number(params.siteId), Number(params.importId)));
    return null;
  };

/** One import: its dry run, the fate of its rows, and what can be done with it. */
export function ImportPage() {
  const { siteId } = useSite();
  const importId = Number(useParams().importId);
  const { data: one } = useSuspenseQuery(importQuery(siteId, importId));
  const { fileName, kind, state, rowCount, rowsRead, encoding, separator } = one;
  const home = `/sites/${siteId}/machines/import`;
  return (
    <>
      <PageHeader
        title={fileName}
        crumbs={[
          machinesCrumb(siteId),
          { label: 'Import and export', to: home },
          { label: fileName },
        ]}
        state={<StateMark shape={stateShapes[state]}>{stateWords[state]}</StateMark>}
        facts={[
          { label: 'Kind', value: kindWords[kind] },
          { label: 'Rows', value: rowCount },
          { label: 'Read as', value: `${encoding}, ${separator}` },
          { label: 'Sent', value: `${formatInstant(one.uploadedAt)}, ${one.uploadedByName}` },
        ]}
        actions={
          <ButtonLink to={home} icon="upload">
            Another file
          </ButtonLink>
        }
      />
      {one.appliedAt !== null && (
        <p className="mb-2 text-sm">
          Applied {formatInstant(one.appliedAt)} by {one.appliedByName}.
          {one.undoneAt !== null &&
            ` Undone ${formatInstant(one.undoneAt)} by ${one.undoneByName}.`}
        </p>
      )}
      <ImportActions siteId={siteId} one={one} />
      {state === 'reading' ? (
        <div className="mt-3">
          <ProgressBar
            label="Rows checked"
            value={rowsRead}
            max={rowCount}
            text={`${rowsRead} of ${rowCount}`}
          />
        </div>
      ) : (
        <Rows siteId={siteId} importId={importId} counts={one.counts} total={rowsRead} />
      )}
    </>
  );
}

function Rows({
  siteId,
  importId,
  counts,
  total,
}: {
  siteId: number;
  importId: number;
  counts: Readonly<Record<(typeof rowFates)[number], number>>;
  total: number;
}) {
  const { search, set } = useListAddress();
  const query = readListQuery(importRowsContract, search);
  const { data, isFetching } = useQuery({
    ...importRowsQuery(siteId, importId, query),
    placeholderData: keepPreviousData,
    throwOnError: true,
  });
  return (
    <section aria-label="Rows of the file" className="mt-4">
      <div className="mb-3 flex flex-wrap items-center gap-x-6 gap-y-2">
        <Select
          aria-label="Fate"
          className="w-48"
          placeholder={`Every fate (${total})`}
          value={query.fate ?? ''}
          options={rowFates.map((fate) => ({
            value: fate,
            label: `${fateWords[fate]} (${counts[fate]})`,
          }))}
          onChange={({ target }) => set({ fate: target.value })}
        />
        <dl className="flex flex-wrap gap-x-5 text-sm">
          {rowFates.map((fate) => (
            <div key={fate} className="flex gap-1.5">
              <dt className="text-ink-soft">{fateWords[fate]}</dt>
              <dd className="figures">{counts[fate]}</dd>
            </div>
          ))}
        </dl>
      </div>
      <FateTable
        rows={data?.items ?? []}
        fetching={isFetching}
        empty={<EmptyState title="No rows of this fate">Choose another fate.</EmptyState>}
      />
      {data && data.total > 0 && (
        <Pager
          noun="rows"
          page={query.page}
          pageSize={query.pageSize}
          total={data.total}
          onPage={(page) => set({ page })}
          onPageSize={(pageSize) => set({ pageSize })}
        />
      )}
    </section>
  );
}
