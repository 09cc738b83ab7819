import { ScanText } from 'lucide-react';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useReadingQuality } from '../../features/reading-quality/api/get-reading-quality.ts';
import {
  KindTable,
  MonthTable,
} from '../../features/reading-quality/components/quality-tables.tsx';

/** How often people had to correct what was read off their papers. */
export function Component() {
  const quality = useReadingQuality();
  return (
    <PageFrame>
      <PageHeading title="How well papers are read">
        What was read off a scan, beside what a person settled on. Only papers that somebody has
        decided count, so a kind that was waved through counts as right.
      </PageHeading>
      <QueryView query={quality} what="the figures">
        {(data) =>
          data.papers === 0 ? (
            <EmptyState icon={<ScanText />} title="No figures yet">
              They begin with the first scanned paper that somebody decides.
            </EmptyState>
          ) : (
            <div className="space-y-8">
              <MonthTable quality={data} />
              <KindTable quality={data} />
            </div>
          )
        }
      </QueryView>
    </PageFrame>
  );
}
