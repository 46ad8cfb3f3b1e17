import { useId, type ComponentProps } from 'react';
import { cx } from './cx';
import { CONTROL_STYLE, Field, FieldError, wireField, type FieldProps } from './field';

type Control<Tag extends 'input' | 'select' | 'textarea'> = FieldProps &
  Omit<ComponentProps<Tag>, keyof FieldProps | 'children'>;

export type TextInputProps = Control<'input'>;
export type NumberInputProps = Omit<Control<'input'>, 'type'> & { unit?: string };
export type DateTimeInputProps = Omit<Control<'input'>, 'type'> & { dateOnly?: boolean };
export type TextAreaProps = Control<'textarea'>;
export type SelectOption = { value: string; label: string; disabled?: boolean };
export type SelectProps = Control<'select'> & { options: SelectOption[]; placeholder?: string };
export type CheckboxProps = Omit<Control<'input'>, 'type' | 'optional' | 'hideLabel'>;

function split<Props extends FieldProps & { id?: string }>(props: Props) {
  const { label, hint, error, optional, hideLabel, className, id, ...rest } = props;
  return { field: { label, hint, error, optional, hideLabel, className }, id, rest };
}

export function TextInput(props: TextInputProps) {
  const ownId = useId();
  const { field, id = ownId, rest } = split(props);
  return (
    <Field id={id} {...field}>
      <input type="text" {...rest} {...wireField(id, field)} className={CONTROL_STYLE} />
    </Field>
  );
}

/** A text field for a figure. Not type="number": that hides what was typed when it is not a number. */
export function NumberInput({ unit, ...props }: NumberInputProps) {
  const ownId = useId();
  const { field, id = ownId, rest } = split(props);
  return (
    <Field id={id} {...field}>
      <div className="flex items-center gap-2">
        <input
          inputMode="decimal"
          autoComplete="off"
          {...rest}
          {...wireField(id, field)}
          type="text"
          className={cx(CONTROL_STYLE, 'figures max-w-48 text-right')}
        />
        {unit && <span className="text-ink-soft">{unit}</span>}
      </div>
    </Field>
  );
}

/** Times are kept in UTC, and the field says so. */
export function DateTimeInput({ dateOnly = false, hint, ...props }: DateTimeInputProps) {
  const ownId = useId();
  const {
    field,
    id = ownId,
    rest,
  } = split({ ...props, hint: hint ?? (dateOnly ? undefined : 'Time in UTC') });
  return (
    <Field id={id} {...field}>
      <input
        {...rest}
        {...wireField(id, field)}
        type={dateOnly ? 'date' : 'datetime-local'}
        className={cx(CONTROL_STYLE, 'figures max-w-64')}
      />
    </Field>
  );
}

export function TextArea(props: TextAreaProps) {
  const ownId = useId();
  const { field, id = ownId, rest } = split(props);
  return (
    <Field id={id} {...field}>
      <textarea rows={4} {...rest} {...wireField(id, field)} className={CONTROL_STYLE} />
    </Field>
  );
}

export function Select({ options, placeholder, ...props }: SelectProps) {
  const ownId = useId();
  const { field, id = ownId, rest } = split(props);
  return (
    <Field id={id} {...field}>
      <select {...rest} {...wireField(id, field)} className={CONTROL_STYLE}>
        {placeholder && <option value="">{placeholder}</option>}
        {options.map((option) => (
          <option key={option.value} value={option.value} disabled={option.disabled}>
            {option.label}
          </option>
        ))}
      </select>
    </Field>
  );
}

export function Checkbox(props: CheckboxProps) {
  const ownId = useId();
  const { field, id = ownId, rest } = split(props);
  return (
    <div className={cx('flex flex-col gap-1', field.className)}>
      <div className="flex items-start gap-2.5">
        <input
          {...rest}
          {...wireField(id, field)}
          type="checkbox"
          className="mt-0.5 size-6 shrink-0 cursor-pointer accent-press md:size-5"
        />
        <label htmlFor={id} className="cursor-pointer leading-7 md:leading-6">
          {field.label}
        </label>
      </div>
      {field.hint && (
        <p id={`${id}-hint`} className="pl-8.5 text-sm text-ink-soft">
          {field.hint}
        </p>
      )}
      <FieldError id={id} error={field.error} />
    </div>
  );
}
