import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import type { PlainIndex, PlainVoigt } from '../../../../shared/dispersion.ts';
import type { Material, MaterialSummary } from '../../../../shared/material.ts';
import type { FitResult } from '../../../../shared/materialFit.ts';
import { Button } from '../../../components/Button.tsx';
import { FormError } from '../../../components/Field.tsx';
import { ApiError } from '../../../lib/apiClient.ts';
import { useFit } from '../api/fitMaterial.ts';
import { materialVersionQuery } from '../api/materialVersion.ts';
import { fittedSource } from '../model/fitted.ts';
import type { SourceForm } from '../model/form.ts';
import { Check } from './Check.tsx';
import { FitData } from './FitData.tsx';
import { FitReport } from './FitReport.tsx';
import { FitRunning } from './FitRunning.tsx';

type Plain = PlainIndex | PlainVoigt;

type Props = {
  groupId: string;
  target: 'index' | 'voigt';
  /** The model of the form with its values, from which the fit starts. */
  start: Plain;
  materials: readonly MaterialSummary[];
  onUse: (fitted: Plain, source: SourceForm) => void;
};

/** Fits the model of the form to the table of a material, and shows how well before anything is taken over. */
export function FitPanel({ groupId, target, start, materials, onUse }: Props) {
  const [materialId, setMaterialId] = useState('');
  const [whole, setWhole] = useState(true);
  const [fixed, setFixed] = useState<readonly string[]>([]);
  const [found, setFound] = useState<{ result: FitResult; data: Material } | null>(null);
  const [used, setUsed] = useState(false);
  const client = useQueryClient();
  const fit = useFit(groupId);
  const data = materials.find(({ id }) => id === materialId);
  const tableRange = target === 'index' ? data?.rangeNm : data?.voigtRangeNm;

  const run = () => {
    if (!data) return;
    setUsed(false);
    const body = {
      material: data.id,
      version: data.version,
      target,
      start,
      fixed: [...fixed],
      ...(whole && tableRange ? { rangeNm: tableRange } : {}),
    };
    fit.mutate(body, {
      onSuccess: (result) => {
        void client
          .fetchQuery(materialVersionQuery(data.id, data.version))
          .then((material) => setFound({ result, data: material }));
      },
    });
  };
  const hold = (name: string, held: boolean) =>
    setFixed((now) => (held ? [...now, name] : now.filter((one) => one !== name)));

  return (
    <details className="rounded-control border border-line px-3 py-2">
      <summary className="w-fit text-accent">Fit these values to a table</summary>
      <div className="mt-3 flex flex-col gap-3">
        <FitData target={target} materials={materials} chosen={materialId} onChoose={setMaterialId} />
        <Check
          label={
            whole
              ? 'All points of the table'
              : 'All points of the table (now: those in the range of validity)'
          }
          checked={whole}
          onChange={setWhole}
        />
        {fit.isPending ? (
          <FitRunning onCancel={fit.cancel} />
        ) : (
          <Button className="w-fit" disabled={!data} onClick={run}>
            {found ? 'Fit again from the values in the form' : 'Fit'}
          </Button>
        )}
        <FormError message={fit.error ? describe(fit.error) : undefined} />
        {found && !fit.isPending ? (
          <>
            <FitReport
              target={target}
              result={found.result}
              dataName={found.data.name}
              fixed={fixed}
              onHold={hold}
            />
            <div className="flex flex-wrap items-center gap-3">
              <Button
                onClick={() => {
                  onUse(found.result.fitted, fittedSource(target, found.data, found.result));
                  setUsed(true);
                }}
              >
                Use these values
              </Button>
              <p role="status" className="text-note text-muted">
                {used
                  ? 'The form holds the fitted values; the source below names the data and the fit.'
                  : 'Puts them into the form, with the source of the data and the confidence "fitted".'}
              </p>
            </div>
          </>
        ) : null}
      </div>
    </details>
  );
}

function describe(error: Error): string {
  const issues = error instanceof ApiError ? error.issues : [];
  return [error.message, ...issues.map(({ path, message }) => `${path}: ${message}`)].join('\n');
}
