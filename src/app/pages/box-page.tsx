import { useEffect, useState } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { FilePen, Printer } from 'lucide-react';
import { Link } from 'react-router-dom';
import { toast } from 'sonner';
import { boxEndpoints } from '../../../server/contract/boxes.ts';
import { PageFrame } from '../../components/layout/page-frame.tsx';
import { PageHeading } from '../../components/layout/page-heading.tsx';
import { Banner } from '../../components/ui/banner.tsx';
import { Button, FileLink, LinkButton } from '../../components/ui/button.tsx';
import { QueryView } from '../../components/ui/query-view.tsx';
import { Section } from '../../components/ui/section.tsx';
import { EmptyState } from '../../components/ui/states.tsx';
import { useBox } from '../../features/boxes/api/get-box.ts';
import { EnterPaperDialog } from '../../features/papers-entry/components/enter-paper-dialog.tsx';
import { useScans } from '../../features/scans/api/list-scans.ts';
import { useRetryScan } from '../../features/scans/api/retry-scan.ts';
import { DropZone } from '../../features/scans/components/drop-zone.tsx';
import { ScanList } from '../../features/scans/components/scan-list.tsx';
import { SendingList } from '../../features/scans/components/sending-list.tsx';
import { useSending } from '../../features/scans/logic/use-sending.ts';
import { buildApiUrl } from '../../lib/api-client.ts';
import { formatCount } from '../../lib/format.ts';
import { paths } from '../../lib/paths.ts';
import { useMay } from '../../lib/use-may.ts';
import { useHouseholdInView } from '../layout/household-in-view.ts';
import { useRouteId } from '../use-route-id.ts';

/** One box: papers go in here, and reading shows how far it is. */
export function Component() {
  const boxId = useRouteId('boxId');
  const box = useBox(boxId);
  const scans = useScans(boxId);
  const sending = useSending(boxId);
  const retry = useRetryScan(boxId);
  const [isEntering, setIsEntering] = useState(false);
  const householdId = box.data?.householdId;
  useHouseholdInView(householdId);
  const { reading, toReview } = box.data?.counts ?? {};
  const queryClient = useQueryClient();
  useEffect(() => {
    // What the household's tasks count goes with what was read here.
    if (householdId) void queryClient.invalidateQueries({ queryKey: ['households', householdId] });
  }, [queryClient, householdId, reading, toReview]);
  const mayUpload = useMay('scan:upload', householdId);
  const mayEnter = useMay('paper:enter', householdId);
  const mayReview = useMay('paper:review', householdId);
  return (
    <PageFrame>
      <PageHeading
        title={box.data ? `${box.data.code} ${box.data.label}`.trim() : 'Box'}
        above={
          householdId ? (
            <Link to={paths.boxes(householdId)} className="underline hover:text-ink">
              Boxes{box.data?.areaName ? ` · ${box.data.areaName}` : ''}
            </Link>
          ) : (
            ' '
          )
        }
        actions={
          <>
            {mayEnter && householdId ? (
              <Button icon={<FilePen aria-hidden />} onClick={() => setIsEntering(true)}>
                Enter without a scan
              </Button>
            ) : null}
            {householdId ? (
              <FileLink
                href={buildApiUrl(boxEndpoints.getSeparatorSheet, { params: { id: householdId } })}
                target="_blank"
                rel="noreferrer"
                icon={<Printer aria-hidden />}
              >
                Print a separator sheet
              </FileLink>
            ) : null}
            <FileLink
              href={buildApiUrl(boxEndpoints.getBoxLabel, { params: { id: boxId } })}
              target="_blank"
              rel="noreferrer"
              icon={<Printer aria-hidden />}
            >
              Print the label
            </FileLink>
          </>
        }
      />
      <QueryView query={box} what="this box">
        {(data) => (
          <>
            {mayUpload ? <DropZone onFiles={sending.send} /> : null}
            <SendingList
              files={sending.files}
              onAgain={sending.sendAgain}
              onClear={sending.clear}
            />
            {data.counts.toReview > 0 && mayReview ? (
              <Banner
                tone="good"
                className="mt-6"
                title={`${formatCount(data.counts.toReview, 'paper')} from this box to look at`}
                action={
                  <LinkButton tone="primary" to={paths.review(data.householdId)}>
                    Look through
                  </LinkButton>
                }
              >
                They are read. A person decides what becomes of each.
              </Banner>
            ) : null}
            <Section title="Scans">
              <QueryView query={scans} what="the scans">
                {({ items }) =>
                  items.length > 0 ? (
                    <ScanList
                      scans={items}
                      mayRetry={mayUpload}
                      retrying={retry.isPending ? retry.variables : null}
                      onRetry={(scanId) => retry.mutate(scanId)}
                    />
                  ) : (
                    <EmptyState title="Nothing scanned yet">
                      Scans sent to this box appear here, with how far they are read.
                    </EmptyState>
                  )
                }
              </QueryView>
            </Section>
          </>
        )}
      </QueryView>
      {isEntering && householdId ? (
        <EnterPaperDialog
          householdId={householdId}
          boxId={boxId}
          onClose={() => setIsEntering(false)}
          onEntered={(paper) => {
            setIsEntering(false);
            toast.success(`Entered as paper ${paper.number}.`);
          }}
        />
      ) : null}
    </PageFrame>
  );
}
