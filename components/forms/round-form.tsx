'use client';

import { Checkbox, DateTimeInput, NumberInput, Select, TextArea, TextInput } from '@/components/ui/controls';
import { FormMessage } from '@/components/ui/form-message';
import { SubmitButton } from '@/components/ui/submit-button';
import { CURRENCIES, roundSchema } from '@/lib/schemas/rounds';
import { useCheckedForm } from './use-checked-form';
import type { FormAction } from './use-server-form';

export type RoundValues = {
  name: string;
  isPast: boolean;
  opensAt: string;
  dispatchAt: string;
  closesAt: string;
  publishAt: string;
  instructions: string;
  fee: string;
  feeCurrency: string;
};

export type RoundFormProps = {
  action: FormAction;
  values: RoundValues;
  /** The round that is changed; a new one has none. */
  round?: string;
  /** Schemes to choose from, for a new round. */
  schemes?: { slug: string; name: string }[];
  scheme?: string;
  /** Once a round is open, only its later dates and the instructions move. */
  isOpen?: boolean;
  onDone?: () => void;
};

type Form = ReturnType<typeof useCheckedForm>;

export function RoundForm({ action, values, round, schemes, scheme, isOpen, onDone }: RoundFormProps) {
  const form = useCheckedForm(roundSchema, action, { ...values, scheme: scheme ?? '' }, onDone);
  return (
    <form {...form.formProps} className="flex max-w-measure flex-col gap-5">
      {round && <input type="hidden" name="round" value={round} />}
      {schemes && (
        <Select
          label="Scheme"
          options={schemes.map((entry) => ({ value: entry.slug, label: entry.name }))}
          placeholder="Choose a scheme"
          {...form.field('scheme')}
        />
      )}
      <TextInput
        label="Name of the round"
        hint="Such as Maize 2027-1"
        readOnly={isOpen}
        {...form.field('name')}
      />
      {!isOpen && <PastRound form={form} />}
      {isOpen && values.isPast && <input type="hidden" name="isPast" value="on" />}
      <Dates form={form} isOpen={isOpen} />
      <TextArea
        label="Instructions to participants"
        optional
        hint="How to report, how many replicates, what to do on arrival"
        {...form.field('instructions')}
      />
      <div className="flex flex-wrap gap-4">
        <NumberInput label="Fee" optional readOnly={isOpen} {...form.field('fee')} />
        {isOpen ? (
          <input type="hidden" name="feeCurrency" value={values.feeCurrency} />
        ) : (
          <Select
            label="Currency"
            options={CURRENCIES.map((value) => ({ value, label: value }))}
            {...form.field('feeCurrency')}
          />
        )}
      </div>
      <FormMessage>{form.formError}</FormMessage>
      <div>
        <SubmitButton pending={form.pending} pendingLabel="Saving">
          {round ? 'Save' : 'Create round'}
        </SubmitButton>
      </div>
    </form>
  );
}

function PastRound({ form }: { form: Form }) {
  return (
    <Checkbox
      label="This is a past round"
      hint={
        'Its results are loaded from a file, so that the scheme brings its history. Its dates may lie in the past ' +
        'and no mail is sent to participants.'
      }
      value="on"
      {...form.tick('isPast')}
    />
  );
}

function Dates({ form, isOpen }: { form: Form; isOpen?: boolean }) {
  return (
    <fieldset className="flex flex-col gap-4">
      <legend className="mb-2 font-serif text-lg font-semibold">Dates</legend>
      <div className="grid gap-4 sm:grid-cols-2">
        <DateTimeInput label="Opening" readOnly={isOpen} {...form.field('opensAt')} />
        <DateTimeInput label="Dispatch of the items" readOnly={isOpen} {...form.field('dispatchAt')} />
        <DateTimeInput label="Results due" {...form.field('closesAt')} />
        <DateTimeInput label="Publication" {...form.field('publishAt')} />
      </div>
    </fieldset>
  );
}
