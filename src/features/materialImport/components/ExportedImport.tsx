import { useState } from 'react';
import type { ReactNode } from 'react';
import type { Material } from '../../../../shared/material.ts';
import { materialClasses } from '../../../../shared/material.ts';
import type { MaterialImport } from '../../../../shared/materialImport.ts';
import { formatFormula } from '../../../lib/format.ts';
import { useKeepImported } from '../api/keepImported.ts';
import { keepExportedRequest } from '../model/keepRequest.ts';
import { emptyNaming } from '../model/naming.ts';
import { ImportStep, StepList } from './ImportStep.tsx';
import { KeepForm } from './KeepForm.tsx';

type ExportedImportProps = {
  groupId: string;
  importId: string;
  exported: NonNullable<MaterialImport['exported']>;
  tableStep: ReactNode;
  onKept: (material: Material) => void;
};

const asked = { name: true, indexSource: false, voigtSource: false };

/** A file that Skewlight exported: everything is in it, so only the name is asked. */
export function ExportedImport({ groupId, importId, exported, tableStep, onKept }: ExportedImportProps) {
  const [naming, setNaming] = useState(() => ({
    ...emptyNaming,
    name: exported.name,
    formula: exported.formula,
    class: materialClasses.find((one) => one === exported.class) ?? ('' as const),
  }));
  const keep = useKeepImported(onKept);
  return (
    <>
      <StepList states={{ table: 'done', columns: 'done', signs: 'done', result: 'done', keep: 'open' }} />
      <div className="flex flex-col gap-4">
        {tableStep}
        <p className="rounded-control bg-accent-soft px-3 py-2">
          This is {formatFormula(exported.formula)}, {exported.name}, as Skewlight exported it. Its columns,
          signs, units and sources are in the file, so it is read back to the same numbers without questions,
          as a material of its own.
        </p>
        <ImportStep id="keep" state="open">
          <KeepForm
            asked={asked}
            action="Create material"
            values={naming}
            onChange={setNaming}
            busy={keep.isPending}
            onKeep={async (form, refuse) => {
              await keep.mutateAsync(keepExportedRequest(groupId, importId, form)).catch(refuse);
            }}
          />
        </ImportStep>
      </div>
    </>
  );
}
