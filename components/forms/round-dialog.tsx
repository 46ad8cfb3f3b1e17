'use client';

import { FormDialog } from './form-dialog';
import { RoundForm, type RoundFormProps } from './round-form';

export function RoundDialog(props: Omit<RoundFormProps, 'onDone'>) {
  return (
    <FormDialog label="Edit dates and instructions" title="Dates and instructions" size="small" wide>
      {(close) => <RoundForm {...props} onDone={close} />}
    </FormDialog>
  );
}
