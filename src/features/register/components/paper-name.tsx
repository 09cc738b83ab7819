import { Link } from 'react-router-dom';
import { classLabel } from '../../../../server/contract/document-classes.ts';
import type { PaperRow } from '../../../../server/contract/papers.ts';
import { paths } from '../../../lib/paths.ts';

/** What a paper is, as a link to it; with a search, the words found in it. */
export function PaperName({ paper }: { paper: PaperRow }) {
  return (
    <>
      <Link
        to={paths.review(paper.householdId, paper.id)}
        className="font-semibold text-teal-strong underline decoration-transparent hover:decoration-current"
      >
        {classLabel(paper.class)}
      </Link>
      {paper.title ? <span className="block text-sm text-ink-soft">{paper.title}</span> : null}
      {paper.snippet ? <Snippet text={paper.snippet} /> : null}
    </>
  );
}

/** Words found stand between « and » in the text that the server sends. */
function Snippet({ text }: { text: string }) {
  const parts = text.split(/«([^»]*)»/);
  return (
    <span className="mt-0.5 block max-w-md text-sm text-ink-soft">
      {parts.map((part, index) =>
        index % 2 === 1 ? (
          <mark key={index} className="rounded-sm bg-amber-wash px-0.5 text-ink">
            {part}
          </mark>
        ) : (
          part
        ),
      )}
    </span>
  );
}
