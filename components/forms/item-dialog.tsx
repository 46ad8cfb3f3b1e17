'use client';

import { FormDialog } from './form-dialog';
import { ItemForm, type ItemFormProps } from './item-form';

export function ItemDialog(props: Omit<ItemFormProps, 'onDone'>) {
  const { item } = props;
  return (
    <FormDialog
      label={item ? `Edit item ${item.code}` : 'Add test item'}
      title={item ? `Test item ${item.code}` : 'Add a test item'}
      variant={item ? 'quiet' : 'primary'}
      size={item ? 'small' : 'normal'}
    >
      {(close) => <ItemForm {...props} onDone={close} />}
    </FormDialog>
  );
}
