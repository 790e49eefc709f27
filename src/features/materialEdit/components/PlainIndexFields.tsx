import type { PlainIndexForm } from '../model/form.ts';
import { indexCellPath } from '../model/tableCells.ts';
import { IndexFormulaFields } from './FormulaFields.tsx';
import { CauchyFields, SellmeierFields } from './ModelFields.tsx';
import { OscillatorFields } from './OscillatorFields.tsx';
import { RangeFields } from './RangeFields.tsx';
import { TableGrid } from './TableGrid.tsx';

type Props = {
  form: PlainIndexForm;
  /** Where the API finds this index: `index` or `anisotropy.extraordinary`. */
  path: string;
  /** What the grid is called. */
  name: string;
  onChange: (form: PlainIndexForm) => void;
};

/** The fields of an index that needs no other material. */
export function PlainIndexFields({ form, path, name, onChange }: Props) {
  if (form.kind === 'table') {
    return (
      <TableGrid
        label={`Table of ${name}`}
        columns={['wavelength (nm)', 'n', 'k']}
        rows={form.rows}
        pathOf={indexCellPath(path)}
        onChange={(rows) => onChange({ ...form, rows })}
      />
    );
  }
  return (
    <>
      <ModelFields form={form} path={path} onChange={onChange} />
      <RangeFields
        path={`${path}.rangeNm`}
        rangeNm={form.rangeNm}
        onChange={(rangeNm) => onChange({ ...form, rangeNm })}
      />
    </>
  );
}

type ModelProps = Omit<Props, 'form' | 'name'> & { form: Exclude<PlainIndexForm, { kind: 'table' }> };

function ModelFields({ form, path, onChange }: ModelProps) {
  switch (form.kind) {
    case 'sellmeier':
      return <SellmeierFields form={form} path={path} onChange={onChange} />;
    case 'cauchy':
      return <CauchyFields form={form} path={path} onChange={onChange} />;
    case 'oscillators':
      return <OscillatorFields form={form} path={path} onChange={onChange} />;
    case 'formula':
      return <IndexFormulaFields form={form} path={path} onChange={onChange} />;
  }
}
