import { useState } from 'react';
import type { StackDocument, StackMedium } from '../../../../shared/stack.ts';
import { numberedLayers, sampleSummary } from '../model/sampleParts.ts';
import type { EditFilm } from '../model/sampleParts.ts';
import { AxesRow } from './AxesRow.tsx';
import { BacksideForm } from './BacksideForm.tsx';
import { LayerForm } from './LayerForm.tsx';
import type { PickMedium } from './pickMedium.ts';
import { Row, SampleQuantity } from './SampleQuantity.tsx';
import { SpreadForm } from './SpreadForm.tsx';

type Props = {
  document: StackDocument;
  /** Null for those who may look but not change. */
  edit: EditFilm | null;
  nameOf: (medium: StackMedium) => string;
  isMagnetic: (medium: StackMedium) => boolean;
  hasAxes: (medium: StackMedium) => boolean;
  pickMedium: PickMedium;
};

const SUBSTRATE = 'substrate';

/** What films really are: graded interfaces, dead parts, oxides, mixtures, a slab's back face, spreads. Closed until used. */
export function SamplePanel(props: Props) {
  const { document, edit, nameOf } = props;
  const [open, setOpen] = useState(false);
  const [chosen, setChosen] = useState<string | null>(null);
  const used = sampleSummary(document, nameOf);
  const layers = numberedLayers(document.layers);
  if (edit === null && used.length === 0) return null;
  const picked =
    layers.find(({ layer }) => layer.id === chosen) ?? (chosen === SUBSTRATE ? undefined : layers[0]);
  return (
    <details
      onToggle={(event) => setOpen(event.currentTarget.open)}
      className="mt-3 ml-[38px] rounded-control border border-line bg-panel px-3 py-2 text-note"
    >
      <summary className="rounded-box">
        <span className="font-semibold">Real sample</span>{' '}
        <span className="text-muted">{used.length > 0 ? used.join(', ') : 'ideal so far'}</span>
      </summary>
      {edit && open && (
        <div className="flex flex-col gap-2 pt-2">
          <Row label="Layer">
            <select
              aria-label="Layer of the real sample"
              value={picked?.layer.id ?? SUBSTRATE}
              onChange={(event) => setChosen(event.target.value)}
              className="h-7 max-w-52 field-sizing-content rounded-box border border-line bg-panel px-1.5 text-ink"
            >
              {layers.map(({ layer, position }) => (
                <option key={layer.id} value={layer.id}>
                  {position}. {nameOf(layer.medium)}
                  {layer.note ? `, ${layer.note}` : ''}
                </option>
              ))}
              <option value={SUBSTRATE}>{nameOf(document.substrate)}, substrate</option>
            </select>
          </Row>
          {picked ? (
            <LayerForm {...props} edit={edit} layer={picked.layer} key={picked.layer.id} />
          ) : (
            <>
              <Row label="Graded interface above">
                <SampleQuantity
                  label="width of the graded interface above the substrate"
                  unit="nm"
                  value={document.substrateGradedNm ?? 0}
                  onChange={(value) =>
                    edit(({ substrateGradedNm: _before, ...now }) => {
                      return value > 0 ? { ...now, substrateGradedNm: value } : now;
                    }, 'graded substrate')
                  }
                />
              </Row>
              {props.hasAxes(document.substrate) && (
                <AxesRow
                  medium={document.substrate}
                  name={nameOf(document.substrate)}
                  onChange={(substrate, what) =>
                    edit((now) => ({ ...now, substrate }), `${what} of substrate`)
                  }
                />
              )}
            </>
          )}
          <BacksideForm {...props} edit={edit} />
          <SpreadForm document={document} edit={edit} />
        </div>
      )}
    </details>
  );
}
