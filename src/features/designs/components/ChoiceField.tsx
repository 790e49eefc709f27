import { Field } from '../../../components/Field.tsx';
import { Select } from '../../../components/Select.tsx';
import { useIssue } from '../hooks/issueContext.ts';

type Props<Value extends string> = {
  label: string;
  path: string;
  value: Value;
  options: readonly { value: Value; label: string }[];
  className?: string;
  onChange: (value: Value) => void;
};

export function ChoiceField<Value extends string>(props: Props<Value>) {
  const { label, path, value, options, className = '', onChange } = props;
  const error = useIssue(path);
  return (
    <Field label={label} error={error} className={className}>
      {(control) => <Select {...control} value={value} options={options} onValueChange={onChange} />}
    </Field>
  );
}
