import { useFormContext, useWatch } from 'react-hook-form';
import { CountryOptions } from '../../../components/ui/country-fields.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { Select } from '../../../components/ui/select.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { listRegions, listTimeZones, suggestTimeZone } from '../../../lib/places.ts';

interface PlaceValues {
  country: string;
  region: string | null;
  timeZone: string;
}

/** Where a household is: its country decides the rules, its time zone which day it is. */
export function PlaceFields() {
  const { register, control, setValue, formState } = useFormContext<PlaceValues>();
  const [country, timeZone] = useWatch({ control, name: ['country', 'timeZone'] });
  const regions = listRegions(country);
  const { errors } = formState;
  return (
    <div className="grid gap-5 sm:grid-cols-2">
      <Field label="Country" error={errors.country?.message}>
        {(props) => (
          <Select
            {...props}
            {...register('country', {
              onChange: (event: { target: { value: string } }) => {
                setValue('region', null, { shouldDirty: true });
                setValue('timeZone', suggestTimeZone(event.target.value), { shouldDirty: true });
              },
            })}
          >
            <CountryOptions />
          </Select>
        )}
      </Field>
      <Field
        label="Region"
        optional
        hint="Some periods differ. Not known counts as the longest."
        error={errors.region?.message}
      >
        {(props) =>
          regions.length > 0 ? (
            <Select
              {...props}
              {...register('region', { setValueAs: (value: string) => value || null })}
            >
              <option value="">Not known</option>
              {regions.map((region) => (
                <option key={region.value} value={region.value}>
                  {region.label}
                </option>
              ))}
            </Select>
          ) : (
            <TextInput
              {...props}
              {...register('region', { setValueAs: (value: string | null) => value || null })}
              maxLength={40}
            />
          )
        }
      </Field>
      <Field
        label="Time zone"
        hint="Decides which day it is for this household."
        error={errors.timeZone?.message}
      >
        {(props) => (
          <Select {...props} {...register('timeZone')}>
            {listTimeZones(timeZone).map((zone) => (
              <option key={zone} value={zone}>
                {zone.replace(/_/g, ' ')}
              </option>
            ))}
          </Select>
        )}
      </Field>
    </div>
  );
}
