import { Banner } from '../../../components/ui/banner.tsx';
import { ApiError, isConflict, sentenceOf } from '../../../lib/api-error.ts';

interface RefusalBannerProps {
  error: unknown;
  /** What did not happen: "Not sent". */
  title: string;
  className?: string;
}

/** Why a step did not happen, paper by paper where the reasons are about papers. */
export function RefusalBanner({ error, title, className }: RefusalBannerProps) {
  if (isConflict(error)) {
    return (
      <Banner
        alert
        tone="soon"
        title="Somebody else changed this list in the meantime"
        {...(className ? { className } : {})}
      >
        The list is shown as it is now, and what you chose is still chosen. Look at it, then try
        again.
      </Banner>
    );
  }
  const problem = error instanceof ApiError ? error.problem : null;
  const sentences = [
    ...(problem?.reasons ?? []).map((reason) => reason.sentence),
    ...(problem?.fields ?? []).map((field) => field.message),
  ];
  return (
    <Banner alert tone="fault" title={title} {...(className ? { className } : {})}>
      <p>{sentenceOf(error)}</p>
      {sentences.length > 0 ? (
        <ul className="mt-1 list-disc pl-5">
          {[...new Set(sentences)].map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      ) : null}
    </Banner>
  );
}
