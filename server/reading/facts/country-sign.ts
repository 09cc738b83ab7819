/** A print that speaks for a country: names of authorities, forms of numbers, spellings. */
export interface CountrySign {
  country: string;
  /** How plainly it speaks; an authority's name 6, a spelling 1. */
  weight: number;
  pattern: RegExp;
}

/** Signs in large or small letters. */
export function sign(country: string, weight: number, ...sources: string[]): CountrySign[] {
  return sources.map((source) => ({ country, weight, pattern: new RegExp(source, 'gi') }));
}

/** Signs that are capitals in print: postal codes and the like; small letters would find other words. */
export function capitals(country: string, weight: number, ...sources: string[]): CountrySign[] {
  return sources.map((source) => ({ country, weight, pattern: new RegExp(source, 'g') }));
}
