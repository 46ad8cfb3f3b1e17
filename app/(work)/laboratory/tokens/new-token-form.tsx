'use client';

import { useActionState } from 'react';
import { DateTimeInput, TextInput } from '@/components/ui/controls';
import { CopyButton } from '@/components/ui/copy-button';
import { FormMessage } from '@/components/ui/form-message';
import { Notice } from '@/components/ui/notice';
import { SubmitButton } from '@/components/ui/submit-button';
import { addTokenAction } from './actions';

interface NewTokenFormProps {
  firstDay: string;
  lastDay: string;
  address: string;
}

export function NewTokenForm({ firstDay, lastDay, address }: NewTokenFormProps) {
  const [state, action] = useActionState(addTokenAction, null);
  const failed = state?.ok === false ? state : null;
  return (
    <>
      <div aria-live="polite">
        {state?.ok && <FreshToken name={state.data.name} token={state.data.token} address={address} />}
      </div>
      <form action={action} noValidate className="flex max-w-md flex-col gap-4">
        <FormMessage>{failed?.formError}</FormMessage>
        <TextInput
          name="name"
          label="Name"
          hint="What the token is for, such as the name of the program."
          required
          defaultValue={failed?.values?.name}
          error={failed?.fieldErrors?.name}
        />
        <DateTimeInput
          dateOnly
          name="expiresOn"
          label="Last day"
          hint="At most two years from today."
          min={firstDay}
          max={lastDay}
          required
          defaultValue={failed?.values?.expiresOn}
          error={failed?.fieldErrors?.expiresOn}
        />
        <div>
          <SubmitButton pendingLabel="Making">Make a token</SubmitButton>
        </div>
      </form>
    </>
  );
}

function FreshToken({ name, token, address }: { name: string; token: string; address: string }) {
  return (
    <Notice kind="done" title={`${name} is made`}>
      <p>Keep it now, in a safe place: it is not shown again.</p>
      <p className="mt-2 flex flex-wrap items-center gap-2">
        <code className="wrap-anywhere bg-paper-wash px-2 py-1 text-sm">{token}</code>
        <CopyButton text={token} />
      </p>
      <p className="mt-2 text-sm text-ink-soft">
        Programs send it as <code>Authorization: Bearer …</code> to {address}/api/.
      </p>
    </Notice>
  );
}
