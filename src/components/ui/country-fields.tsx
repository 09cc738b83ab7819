import { useMemo } from 'react';
import { countriesWithRules, listOtherCountries } from '../../lib/places.ts';

/** The options of a list of countries: those with rules first. */
export function CountryOptions() {
  const others = useMemo(() => listOtherCountries(), []);
  return (
    <>
      <optgroup label="With rules">
        {countriesWithRules.map((c) => (
          <option key={c.value} value={c.value}>
            {c.label}
          </option>
        ))}
      </optgroup>
      <optgroup label="Without rules yet: the adviser is asked">
        {others.map((c) => (
          <option key={c.value} value={c.value}>
            {c.label}
          </option>
        ))}
      </optgroup>
    </>
  );
}
