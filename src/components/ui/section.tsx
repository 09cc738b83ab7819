import { useId } from 'react';
import type { ReactNode } from 'react';

interface SectionProps {
  title: string;
  /** For links to this place in the page. */
  id?: string;
  children: ReactNode;
  /** One or two sentences under the title. */
  intro?: ReactNode;
  actions?: ReactNode;
}

/** A part of a screen under an h2. */
export function Section({ title, id, intro, actions, children }: SectionProps) {
  const titleId = useId();
  return (
    <section id={id} aria-labelledby={titleId} className="mt-10 scroll-mt-6 first:mt-0">
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-6 gap-y-3">
        <div className="max-w-prose">
          <h2 id={titleId} className="text-xl font-semibold">
            {title}
          </h2>
          {intro ? <p className="mt-1 text-ink-soft">{intro}</p> : null}
        </div>
        {actions}
      </div>
      {children}
    </section>
  );
}
