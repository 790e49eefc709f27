import { Field } from '../../../components/Field.tsx';
import { TextInput } from '../../../components/TextInput.tsx';
import { useIssue } from '../hooks/issueContext.ts';

type Props = {
  label: string;
  path: string;
  value: string;
  placeholder?: string;
  className?: string;
  onChange: (value: string) => void;
};

export function TextField({ label, path, value, placeholder, className = '', onChange }: Props) {
  const error = useIssue(path);
  return (
    <Field label={label} error={error} className={className}>
      {(control) => (
        <TextInput
          {...control}
          value={value}
          placeholder={placeholder}
          onChange={(event) => onChange(event.target.value)}
        />
      )}
    </Field>
  );
}
