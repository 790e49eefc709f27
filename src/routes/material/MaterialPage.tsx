import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import type { Material } from '../../../shared/material.ts';
import { Page } from '../../components/Page.tsx';
import { QueryGate } from '../../components/QueryGate.tsx';
import { Select } from '../../components/Select.tsx';
import { materialQuery } from '../../features/materials/api/material.ts';
import { ClassMark } from '../../features/materials/components/ClassMark.tsx';
import { DispersionDetail } from '../../features/materials/components/DispersionDetail.tsx';
import { IndexPlot } from '../../features/materials/components/IndexPlot.tsx';
import { SourceList } from '../../features/materials/components/SourceList.tsx';
import { VoigtPanel } from '../../features/materials/components/VoigtPanel.tsx';
import { spectralLabels, spectralUnits } from '../../features/materials/components/spectralScale.ts';
import type { SpectralUnit } from '../../features/materials/components/spectralScale.ts';
import { formatFormula, formatRange } from '../../lib/format.ts';

const unitOptions = spectralUnits.map((unit) => ({ value: unit, label: spectralLabels[unit] }));

/** The version in the address, when there is one that can be. */
function versionOf(text: string | null): number | null {
  const version = Number(text);
  return Number.isInteger(version) && version > 0 ? version : null;
}

/** `Co, Cobalt`, but not `BK7, BK7 glass`. */
function titleOf({ formula, name }: Material): string {
  return name.startsWith(`${formula} `) ? name : `${formatFormula(formula)}, ${name}`;
}

export function MaterialPage() {
  const { materialId = '' } = useParams();
  const [search] = useSearchParams();
  const material = useQuery(materialQuery(materialId, versionOf(search.get('version'))));
  const title = material.data ? titleOf(material.data) : 'Material';
  return (
    <Page title={title} subtitle={material.data ? <MaterialLine material={material.data} /> : null}>
      <QueryGate query={material} what="material">
        {(data) => <MaterialDetail material={data} />}
      </QueryGate>
    </Page>
  );
}

function MaterialLine({ material }: { material: Material }) {
  return (
    <span className="flex flex-wrap items-center gap-x-4 gap-y-1">
      <ClassMark of={material.class} />
      <span>version {material.version}</span>
      <span>{material.groupId ? 'of this group' : 'shipped library'}</span>
      {material.preferred ? <span>preferred source for {formatFormula(material.formula)}</span> : null}
      <span>
        id <code className="select-all">{material.id}</code>
      </span>
    </span>
  );
}

function MaterialDetail({ material }: { material: Material }) {
  const [search, setSearch] = useSearchParams();
  const unit: SpectralUnit = search.get('axis') === 'eV' ? 'eV' : 'nm';
  const chooseUnit = (chosen: SpectralUnit) =>
    setSearch(
      (before) => {
        if (chosen === 'eV') before.set('axis', 'eV');
        else before.delete('axis');
        return before;
      },
      { replace: true },
    );
  const { content } = material;
  return (
    <div className="flex flex-col gap-4">
      <div className="grid gap-4 lg:grid-cols-[1.5fr_1fr]">
        <section aria-labelledby="index-heading" className="card min-w-0 px-4 py-3.5">
          <div className="mb-2 flex flex-wrap items-baseline justify-between gap-2">
            <h2 id="index-heading" className="text-body">
              Refractive index N = n + ik
              <span className="ml-3 text-note font-normal text-muted">
                {formatRange(material.rangeNm, 'nm')}
              </span>
            </h2>
            <Select
              aria-label="Horizontal axis"
              value={unit}
              options={unitOptions}
              onValueChange={chooseUnit}
            />
          </div>
          <IndexPlot material={material} unit={unit} />
          <div className="mt-3">
            <DispersionDetail index={content.index} />
          </div>
        </section>
        <section aria-labelledby="index-source-heading" className="card px-4 py-3.5">
          <h2 id="index-source-heading" className="mb-2 text-body">
            Where n and k come from
          </h2>
          <SourceList source={content.indexSource} />
        </section>
      </div>
      <div className="grid gap-4 lg:grid-cols-[1.5fr_1fr]">
        <section aria-labelledby="voigt-heading" className="card min-w-0 px-4 py-3.5">
          <h2 id="voigt-heading" className="mb-2 text-body">
            Voigt constant Q
          </h2>
          <VoigtPanel material={material} unit={unit} />
        </section>
        {content.voigtSource ? (
          <section aria-labelledby="voigt-source-heading" className="card px-4 py-3.5">
            <h2 id="voigt-source-heading" className="mb-2 text-body">
              Where Q comes from
            </h2>
            <SourceList source={content.voigtSource} />
          </section>
        ) : null}
      </div>
      {material.notes.length > 0 ? (
        <section aria-labelledby="notes-heading" className="max-w-prose">
          <h2 id="notes-heading" className="mb-2 text-body">
            Notes
          </h2>
          <ul className="flex list-disc flex-col gap-1.5 pl-5 text-muted">
            {material.notes.map((note) => (
              <li key={note}>{note}</li>
            ))}
          </ul>
        </section>
      ) : null}
    </div>
  );
}
