import type { CaseInputs } from '../../server/contract/cases.ts';
import type { ClassId } from '../../server/contract/document-classes.ts';

/** A case, what the rules say of it, and where that is published. */
export interface PublishedCase {
  readonly title: string;
  readonly country: string;
  readonly class: ClassId;
  readonly inputs: CaseInputs;
  readonly expected: {
    readonly keepUntil: string | null;
    readonly shredFrom: string | null;
    readonly permanent?: boolean;
    readonly open?: boolean;
  };
  readonly source: string;
}
