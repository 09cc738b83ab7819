import type { securityLevels } from '../contract/assessments.ts';

type SecurityLevel = (typeof securityLevels)[number];

/**
 * Largest particle in square millimetres that a level allows for paper: ISO/IEC 21964, same content as
 * DIN 66399. P-1 to P-4 as in an equipment maker's summary of the standard; P-5 to P-7 from memory.
 */
const largestParticleMm2: Record<SecurityLevel, number> = {
  'P-1': 2000,
  'P-2': 800,
  'P-3': 320,
  'P-4': 160,
  'P-5': 30,
  'P-6': 10,
  'P-7': 5,
};
const levelsFromSummary: readonly SecurityLevel[] = ['P-1', 'P-2', 'P-3', 'P-4'];

export const levelStandards = 'ISO/IEC 21964 and DIN 66399';

/** What a level asks of a shredder, and how well that figure was checked. */
export function sayLevel(level: SecurityLevel): string {
  const area = largestParticleMm2[level].toLocaleString('en-GB');
  const checked = levelsFromSummary.includes(level)
    ? "by a maker's summary of the standard"
    : 'not checked at the source';
  return `Level ${level} of ${levelStandards}: particles of at most ${area} mm² (${checked}).`;
}
