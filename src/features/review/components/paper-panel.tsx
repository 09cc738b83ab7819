import { useQuery } from '@tanstack/react-query';
import { FileText } from 'lucide-react';
import { Link } from 'react-router-dom';
import { classLabel, type ClassId } from '../../../../server/contract/document-classes.ts';
import {
  type Paper,
  paperEndpoints,
  type UpdatePaper,
} from '../../../../server/contract/papers.ts';
import { PageHeading } from '../../../components/layout/page-heading.tsx';
import { Banner } from '../../../components/ui/banner.tsx';
import { FileLink } from '../../../components/ui/button.tsx';
import { buildApiUrl } from '../../../lib/api-client.ts';
import { formatCount } from '../../../lib/format.ts';
import { paths } from '../../../lib/paths.ts';
import { useMay } from '../../../lib/use-may.ts';
import { householdQuery } from '../api/get-household.ts';
import type { ReviewCommand } from '../logic/key-map.ts';
import { FactsSection } from './facts-section.tsx';
import { KeepingSection } from './keeping-section.tsx';
import { KindSection } from './kind-section.tsx';
import { QuestionsSection } from './questions-section.tsx';
import { ReasoningSection } from './reasoning-section.tsx';
import { VerdictSection } from './verdict-section.tsx';

interface PaperPanelProps {
  householdId: string;
  paper: Paper;
  isWorking: boolean;
  mayReview: boolean;
  mayHold: boolean;
  canStepDown: boolean;
  activeMark: string | null;
  onActiveMark: (key: string | null) => void;
  onShowPage: (pageNumber: number) => void;
  onChooseKind: (kind: ClassId) => void;
  onAmend: (patch: UpdatePaper) => void;
  onCommand: (command: ReviewCommand) => void;
}

/** What is suggested for a paper, and why. */
export function PaperPanel({
  householdId,
  paper,
  isWorking,
  mayReview,
  mayHold,
  canStepDown,
  activeMark,
  onActiveMark,
  onShowPage,
  onChooseKind,
  onAmend,
  onCommand,
}: PaperPanelProps) {
  const { data: household } = useQuery(householdQuery(householdId));
  const mayExport = useMay('paper:export', householdId);
  const where = [
    `No. ${paper.number}`,
    paper.boxCode && `box ${paper.boxCode}`,
    paper.pages.length > 0
      ? formatCount(paper.pages.length, 'page')
      : formatCount(paper.sheets, 'sheet'),
  ].filter(Boolean);
  return (
    <div className="space-y-5">
      <div>
        <div className="[&>div]:mb-2">
          <PageHeading
            title={classLabel(paper.class)}
            tabTitle={`Look through: no. ${paper.number}`}
            above={where.join(' · ')}
            focusKey={paper.id}
          />
        </div>
        <KindSection
          paper={paper}
          mayReview={mayReview}
          onChange={() => onCommand({ does: 'change-kind' })}
          onChoose={onChooseKind}
        />
      </div>
      {paper.likelyCopyOf && (
        <Banner title="Likely a copy">
          It looks the same as{' '}
          <Link
            className="font-semibold text-teal-strong underline"
            to={paths.review(householdId, paper.likelyCopyOf.id)}
          >
            {classLabel(paper.likelyCopyOf.class)}, no. {paper.likelyCopyOf.number}
          </Link>
          .
        </Banner>
      )}
      <VerdictSection
        paper={paper}
        today={household?.today ?? paper.assessedOn}
        isWorking={isWorking}
        onStepDown={canStepDown ? () => onCommand({ does: 'step-down' }) : null}
      />
      {mayReview ? <QuestionsSection paper={paper} onAmend={onAmend} /> : null}
      <FactsSection
        paper={paper}
        mayReview={mayReview}
        activeMark={activeMark}
        onActiveMark={onActiveMark}
        onShowPage={onShowPage}
        onCorrect={() => onCommand({ does: 'correct-facts' })}
      />
      <KeepingSection
        paper={paper}
        mayReview={mayReview}
        mayHold={mayHold}
        mayCut={mayReview && paper.pages.length > 1}
        onCommand={onCommand}
      />
      <ReasoningSection paper={paper} />
      {paper.text.trim() && (
        <details className="text-sm">
          <summary className="flex min-h-11 cursor-pointer items-center font-semibold">
            The words that were read
          </summary>
          <p className="whitespace-pre-wrap text-ink-soft">{paper.text}</p>
        </details>
      )}
      {mayExport && paper.pages.length > 0 ? (
        <FileLink
          size="small"
          href={buildApiUrl(paperEndpoints.copyPaper, { params: { id: paper.id } })}
          download
          icon={<FileText aria-hidden />}
        >
          Save pages as PDF
        </FileLink>
      ) : null}
    </div>
  );
}
