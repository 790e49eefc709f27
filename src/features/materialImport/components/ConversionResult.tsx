import type { ImportPreview, ImportTable } from '../../../../shared/materialImport.ts';
import { formatCount, formatRange } from '../../../lib/format.ts';
import type { ColumnPlan } from '../model/columnPlan.ts';
import { quantitiesOf } from '../model/columnPlan.ts';
import { BesideTable } from './BesideTable.tsx';
import { ConvertedPlots } from './ConvertedPlots.tsx';
import { KerrFormula } from './KerrFormula.tsx';
import { WarningList } from './WarningList.tsx';

type ConversionResultProps = {
  table: ImportTable;
  plan: ColumnPlan;
  preview: ImportPreview;
  /** Newer answers are being converted while these stand. */
  stale: boolean;
};

/** What the table becomes, how, and what to look at. */
export function ConversionResult({ table, plan, preview, stale }: ConversionResultProps) {
  const { warnings, sentences } = preview;
  return (
    <div className={`flex flex-col gap-4 transition-opacity ${stale ? 'opacity-60' : ''}`}>
      <p role="status" className="text-muted">
        {stale
          ? 'Converting with the new answers'
          : `${formatCount(preview.rowCount)} rows converted, ${formatRange(preview.rangeNm, 'nm')}. ${warnings.length === 0 ? 'Nothing looks wrong.' : warnings.length === 1 ? 'One thing to look at.' : `${warnings.length} things to look at.`}`}
      </p>
      <WarningList label="Warnings about the converted constants" warnings={warnings} />
      {quantitiesOf(plan).voigt === 'Kerr angles' ? <KerrFormula /> : null}
      <ConvertedPlots preview={preview} unit={plan.units.spectral} />
      <div>
        <h3 className="mb-1.5 text-body">Entered and converted, first and last rows</h3>
        <BesideTable table={table} plan={plan} preview={preview} />
      </div>
      <div>
        <h3 className="mb-1.5 text-body">What was done</h3>
        <ul className="flex max-w-prose list-disc flex-col gap-1 pl-5 text-muted">
          {sentences.map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
      </div>
    </div>
  );
}
