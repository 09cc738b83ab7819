import { useCallback } from 'react';
import { Download, FileText, Files } from 'lucide-react';
import { useSearchParams } from 'react-router-dom';
import { paperEndpoints } from '../../../server/contract/papers.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { FileLink, LinkButton } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { Pager } from '../../components/ui/table.tsx';
import { useBoxChoices } from '../../features/register/api/list-boxes.ts';
import { usePapers } from '../../features/register/api/list-papers.ts';
import { RegisterCards } from '../../features/register/components/register-cards.tsx';
import {
  ColumnMenu,
  RegisterFilters,
} from '../../features/register/components/register-filters.tsx';
import { RegisterTable } from '../../features/register/components/register-table.tsx';
import {
  type Filters,
  pageSize,
  readView,
  toQuery,
  type View,
  writeView,
} from '../../features/register/logic/filters.ts';
import { useColumns } from '../../features/register/logic/use-columns.ts';
import { buildApiUrl } from '../../lib/api-client.ts';
import { formatCount } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useMedia } from '../../lib/use-media.ts';
import { useRouteId } from '../use-route-id.ts';

/** The register: every paper of a household, found by any word that is on it. */
export function Component() {
  const householdId = useRouteId('householdId');
  const [search, setSearch] = useSearchParams();
  const view = readView(search);
  const papers = usePapers(householdId, toQuery(view));
  const boxes = useBoxChoices(householdId, useMay('box:read', householdId));
  const mayExport = useMay('paper:export', householdId);
  const isWide = useMedia('(min-width: 48rem)');
  const { visibility, show } = useColumns();

  const go = useCallback(
    (change: (before: View) => View, replace = false) =>
      setSearch((before) => writeView(change(readView(before))), { replace }),
    [setSearch],
  );
  const setFilter = useCallback(
    (change: Partial<Filters>) =>
      go(
        (before) => ({ ...before, page: 1, filters: { ...before.filters, ...change } }),
        'q' in change,
      ),
    [go],
  );
  const { page: _page, pageSize: _pageSize, ...filtered } = toQuery(view);
  return (
    <PageFrame width="wide">
      <PageHeading
        title="All papers"
        actions={
          <>
            {isWide ? <ColumnMenu visibility={visibility} onShow={show} /> : null}
            {mayExport ? (
              <FileLink
                href={buildApiUrl(paperEndpoints.exportPapers, {
                  params: { id: householdId },
                  query: filtered,
                })}
                download
                icon={<Download aria-hidden />}
              >
                Save as CSV
              </FileLink>
            ) : null}
            {mayExport ? (
              <FileLink
                href={buildApiUrl(paperEndpoints.copyPapers, {
                  params: { id: householdId },
                  query: filtered,
                })}
                download
                icon={<FileText aria-hidden />}
              >
                Save pages as PDF
              </FileLink>
            ) : null}
          </>
        }
      />
      <RegisterFilters
        filters={view.filters}
        boxes={boxes.data?.items ?? []}
        onChange={setFilter}
        onClear={() => setSearch(new URLSearchParams())}
      />
      <QueryView query={papers} what="the papers">
        {({ items, total }) => (
          <>
            <p aria-live="polite" className="mb-3 text-sm text-ink-soft">
              {formatCount(total, 'paper')}
            </p>
            {items.length === 0 ? (
              <NothingFound isFiltered={search.size > 0} householdId={householdId} />
            ) : isWide ? (
              <RegisterTable
                rows={items}
                visibility={visibility}
                sort={view.sort}
                onSort={(sort) => go((before) => ({ ...before, sort, page: 1 }))}
              />
            ) : (
              <RegisterCards rows={items} />
            )}
            <Pager
              page={view.page}
              pageSize={pageSize}
              total={total}
              onPage={(page) => go((before) => ({ ...before, page }))}
            />
          </>
        )}
      </QueryView>
    </PageFrame>
  );
}

function NothingFound({ isFiltered, householdId }: { isFiltered: boolean; householdId: string }) {
  return isFiltered ? (
    <EmptyState icon={<Files />} title="No paper fits">
      Try fewer words, or show all again.
    </EmptyState>
  ) : (
    <EmptyState
      icon={<Files />}
      title="No papers yet"
      action={
        <LinkButton tone="primary" to={paths.boxes(householdId)}>
          Bring papers in
        </LinkButton>
      }
    >
      Scan a box, or enter a paper by hand; then it is found here.
    </EmptyState>
  );
}
