import { CalendarDays, CalendarOff, Copy } from 'lucide-react';
import { toast } from 'sonner';
import { Banner } from '../../../components/ui/banner.tsx';
import { Button } from '../../../components/ui/button.tsx';
import { Field } from '../../../components/ui/field.tsx';
import { TextInput } from '../../../components/ui/text-input.tsx';
import { sentenceOf } from '../../../lib/api-error.ts';
import { useEndCalendarAddress, useMakeCalendarAddress } from '../api/make-calendar-address.ts';

/** The secret address under which a calendar program finds the dates. Shown once, when it is made. */
export function CalendarAddress({ householdId }: { householdId: string }) {
  const make = useMakeCalendarAddress(householdId);
  const end = useEndCalendarAddress(householdId);
  const url = make.data?.url;
  return (
    <div className="space-y-4">
      {make.error ? (
        <Banner alert tone="fault" title="No address was made">
          {sentenceOf(make.error)}
        </Banner>
      ) : null}
      {end.error ? (
        <Banner alert tone="fault" title="The address was not ended">
          {sentenceOf(end.error)}
        </Banner>
      ) : null}
      {url ? (
        <div className="flex flex-wrap items-end gap-3">
          <Field
            label="Address for your calendar"
            hint="Whoever has it sees the dates. It is shown this once."
            className="min-w-0 flex-1 basis-80"
          >
            {(props) => (
              <TextInput {...props} readOnly value={url} onFocus={(e) => e.target.select()} />
            )}
          </Field>
          <Button
            icon={<Copy aria-hidden />}
            onClick={() => {
              void navigator.clipboard.writeText(url).then(() => toast.success('Copied.'));
            }}
          >
            Copy
          </Button>
        </div>
      ) : null}
      <div className="flex flex-wrap gap-3">
        <Button
          icon={<CalendarDays aria-hidden />}
          busy={make.isPending}
          onClick={() => make.mutate()}
        >
          {url ? 'Make another address' : 'Make a calendar address'}
        </Button>
        <Button
          icon={<CalendarOff aria-hidden />}
          busy={end.isPending}
          onClick={() =>
            end.mutate(undefined, {
              onSuccess: () => {
                make.reset();
                toast.success('Your address works no more.');
              },
            })
          }
        >
          End my address
        </Button>
      </div>
      <p className="text-sm text-ink-soft">
        The address is yours alone and shows what you may see. A new one makes an earlier one stop
        working.
      </p>
    </div>
  );
}
