import { useRef } from 'react';
import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';

type Props<Form extends { kind: string }> = {
  label: string;
  form: Form;
  options: readonly { value: Form['kind']; label: string }[];
  /** What a kind starts from when it is chosen for the first time. */
  make: (kind: Form['kind']) => Form;
  onChange: (form: Form) => void;
};

/** In which way something is given. What was entered in another way comes back with that way. */
export function KindField<Form extends { kind: string }>({
  label,
  form,
  options,
  make,
  onChange,
}: Props<Form>) {
  const left = useRef(new Map<string, Form>());
  return (
    <Field label={label} className="max-w-md">
      {(control) => (
        <Select
          {...control}
          value={form.kind}
          options={options}
          onValueChange={(kind: Form['kind']) => {
            left.current.set(form.kind, form);
            onChange(left.current.get(kind) ?? make(kind));
          }}
        />
      )}
    </Field>
  );
}
