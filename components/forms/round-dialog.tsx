'use client';

import dynamic from 'next/dynamic';
import { FormDialog } from './form-dialog';
import { FormOnItsWay } from './form-on-its-way';
import type { RoundFormProps } from './round-form';

const RoundForm = dynamic(() => import('./round-form').then((module) => module.RoundForm), {
  loading: FormOnItsWay,
});

export function RoundDialog(props: Omit<RoundFormProps, 'onDone'>) {
  return (
    <FormDialog label="Edit dates and instructions" title="Dates and instructions" size="small" wide>
      {(close) => <RoundForm {...props} onDone={close} />}
    </FormDialog>
  );
}
