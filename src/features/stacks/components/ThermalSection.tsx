import { useQuery } from '@tanstack/react-query';
import type { StackLayer } from '../../../../shared/stack.ts';
import type { LayerThermal } from '../../../../shared/thermal.ts';
import type { MaterialAt } from '../hooks/useMaterials.ts';
import { useFilm } from './film.ts';
import { ThermalForm } from './ThermalForm.tsx';

type Props = { layer: StackLayer; onChange: (thermal: LayerThermal | undefined) => void };

/** The temperature of a magnetic layer, with the law of its material where that has one. */
export function ThermalSection({ layer, onChange }: Props) {
  const { materialAt } = useFilm();
  const { material, version = null } = layer.medium;
  return (
    <details className="mt-3 border-t border-line pt-2.5" open={layer.thermal !== undefined}>
      <summary className="mb-2 rounded-box text-note font-semibold">Temperature</summary>
      {material !== undefined && materialAt ? (
        <FormOfMaterial layer={layer} onChange={onChange} query={materialAt(material, version)} />
      ) : (
        <ThermalForm thermal={layer.thermal} law={null} knownAt={null} onChange={onChange} />
      )}
    </details>
  );
}

function FormOfMaterial({ layer, onChange, query }: Props & { query: ReturnType<MaterialAt> }) {
  const material = useQuery(query);
  if (material.isPending) return <p className="text-note text-muted">Reading the law of the material.</p>;
  return (
    <ThermalForm
      thermal={layer.thermal}
      law={material.data?.content.thermal ?? null}
      knownAt={material.data?.content.voigtSource?.temperature ?? null}
      onChange={onChange}
    />
  );
}
