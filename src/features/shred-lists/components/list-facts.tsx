import type { ReactNode } from 'react';
import type { ShredList } from '../../../../server/contract/shred-lists.ts';
import { formatDay } from '../../../lib/format.ts';
import { instructionWords } from '../logic/words.ts';

const wordsOfHow = (how: string): string =>
  instructionWords[how as keyof typeof instructionWords] ?? how;

/** Who agreed, when, and until when it holds. */
export function AgreedFacts({ approval }: { approval: NonNullable<ShredList['approval']> }) {
  const { instruction } = approval;
  return (
    <FactList title="Agreed">
      <Fact name={instruction ? 'Recorded by' : 'By'}>{approval.byName}</Fact>
      <Fact name="On">{formatDay(approval.on)}</Fact>
      {instruction ? (
        <Fact name="The client’s words">
          “{instruction.words}” ({wordsOfHow(instruction.how).toLowerCase()},{' '}
          {formatDay(instruction.on)})
        </Fact>
      ) : null}
      <Fact name="Shredding from">{formatDay(approval.notBefore)}, or with the client there</Fact>
      <Fact name="Holds until">{formatDay(approval.lapsesOn)}</Fact>
    </FactList>
  );
}

/** What was shredded: when, where, how, who watched. */
export function ShreddedFacts({
  destruction,
}: {
  destruction: NonNullable<ShredList['destruction']>;
}) {
  return (
    <FactList title="What was shredded">
      <Fact name="On">{formatDay(destruction.on)}</Fact>
      <Fact name="Where">{destruction.place}</Fact>
      <Fact name="How">
        {destruction.method}
        {destruction.level ? `, level ${destruction.level}` : ''}
      </Fact>
      <Fact name="Who watched">{destruction.witness}</Fact>
      <Fact name="Client there">{destruction.clientPresent ? 'Yes' : 'No'}</Fact>
      <Fact name="Recorded by">{destruction.recordedByName}</Fact>
    </FactList>
  );
}

function FactList({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section>
      <h2 className="text-lg font-semibold">{title}</h2>
      <dl className="mt-2 grid grid-cols-[8.5rem_minmax(0,1fr)] gap-x-3 gap-y-1.5 text-sm">
        {children}
      </dl>
    </section>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <>
      <dt className="text-ink-soft">{name}</dt>
      <dd>{children}</dd>
    </>
  );
}
