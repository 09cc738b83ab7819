/**
 * Invented papers as plain text in `texts/`, one file for a few groups of kinds. Each begins with
 * `=== class country keyDate`; a key date of `-` means none, `?` that the paper leaves it open.
 */
import { readFileSync, readdirSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import path from 'node:path';
import { requireClass } from '../../../server/contract/document-classes.ts';

export interface SampleText {
  class: string;
  group: string;
  country: string;
  /** Undefined when the paper leaves it open. */
  keyDate: string | null | undefined;
  text: string;
  /** Its first words, to name it in a failure. */
  name: string;
}

const folder = fileURLToPath(new URL('texts', import.meta.url));

/** All papers of all files, in order. */
export function loadSampleTexts(): SampleText[] {
  return readdirSync(folder)
    .sort()
    .flatMap((file) =>
      readFileSync(path.join(folder, file), 'utf8')
        .split(/^=== /m)
        .slice(1)
        .map((part) => {
          const [head = '', ...rest] = part.split('\n');
          const [classId = '', country = '', key = ''] = head.trim().split(' ');
          return {
            class: classId,
            group: requireClass(classId).group ?? 'none',
            country,
            keyDate: key === '?' ? undefined : key === '-' ? null : key,
            text: rest.join('\n'),
            name: rest.join(' ').replace(/\s+/g, ' ').trim().slice(0, 60),
          };
        }),
    );
}
