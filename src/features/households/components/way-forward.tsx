import { ArrowRight, Hand } from 'lucide-react';
import { LinkButton } from '../../../components/ui/button.tsx';
import type { WaitingStep } from '../logic/list-waiting.ts';

/** What waits, in order; the first is the next step and says so. */
export function WayForward({ steps }: { steps: readonly WaitingStep[] }) {
  const [next, ...rest] = steps;
  if (!next) {
    return (
      <p className="border-l-4 border-teal py-2 pl-4 text-lg">
        Slack water: nothing comes in, nothing waits.
      </p>
    );
  }
  return (
    <ol className="flex flex-col">
      <li className="border-l-4 border-teal py-1 pl-4">
        <p className="text-xl font-semibold">{next.title}</p>
        <p className="text-ink-soft">{next.why}</p>
        <LinkButton to={next.to} tone={next.tone === 'hold' ? 'hold' : 'primary'} className="mt-3">
          {next.go}
          <ArrowRight aria-hidden />
        </LinkButton>
      </li>
      {rest.map((step) => (
        <li
          key={step.key}
          className="mt-4 flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-t border-line pt-4"
        >
          <div className="min-w-0 flex-1 basis-56">
            <p className="flex items-center gap-2 font-semibold">
              {step.tone === 'hold' ? (
                <Hand aria-hidden className="size-4.5 shrink-0 text-violet" />
              ) : null}
              {step.title}
            </p>
            <p className="text-sm text-ink-soft">{step.why}</p>
          </div>
          <LinkButton to={step.to} tone={step.tone === 'hold' ? 'hold' : 'quiet'} size="small">
            {step.go}
          </LinkButton>
        </li>
      ))}
    </ol>
  );
}
