import { LIMITS } from '../../../../shared/limits.ts';
import { materialClasses } from '../../../../shared/material.ts';
import type { MaterialForm } from '../model/form.ts';
import { ChoiceField } from './ChoiceField.tsx';
import { Section } from './Section.tsx';
import { TextField } from './TextField.tsx';

type Props = { form: MaterialForm; onChange: (change: Partial<MaterialForm>) => void };

const classNames = {
  magnet: 'magnet',
  noble: 'noble metal',
  refractory: 'refractory metal',
  dielectric: 'dielectric',
  semiconductor: 'semiconductor',
} satisfies Record<(typeof materialClasses)[number], string>;

const classOptions = materialClasses.map((value) => ({ value, label: classNames[value] }));

/** What the material is called and how the cross-section draws it. */
export function NamingSection({ form, onChange }: Props) {
  return (
    <Section title="What it is">
      <div className="flex flex-wrap gap-3">
        <TextField
          label="Name"
          path="name"
          value={form.name}
          maxLength={LIMITS.nameLength}
          placeholder="such as Fused silica"
          className="min-w-56 flex-1"
          onChange={(name) => onChange({ name })}
        />
        <TextField
          label="Formula"
          path="formula"
          value={form.formula}
          maxLength={40}
          placeholder="such as SiO2"
          className="w-36"
          onChange={(formula) => onChange({ formula })}
        />
        <ChoiceField
          label="Class"
          path="class"
          value={form.class}
          options={classOptions}
          className="w-48"
          onChange={(materialClass) => onChange({ class: materialClass })}
        />
      </div>
      <TextField
        label="Notes"
        path="notes"
        value={form.notes}
        lines={2}
        maxLength={20 * LIMITS.noteLength}
        hint="One note a line."
        onChange={(notes) => onChange({ notes })}
      />
    </Section>
  );
}
