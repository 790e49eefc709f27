import type { StackDocument, StackLayer, StackMedium } from '../../../../shared/stack.ts';
import { mixedWith, oxideText, withSample } from '../model/sampleParts.ts';
import type { EditFilm } from '../model/sampleParts.ts';
import { AxesRow } from './AxesRow.tsx';
import { MixtureForm } from './MixtureForm.tsx';
import type { PickMedium } from './pickMedium.ts';
import { Check, Row, SampleQuantity } from './SampleQuantity.tsx';

type Props = {
  document: StackDocument;
  layer: StackLayer;
  edit: EditFilm;
  nameOf: (medium: StackMedium) => string;
  isMagnetic: (medium: StackMedium) => boolean;
  hasAxes: (medium: StackMedium) => boolean;
  pickMedium: PickMedium;
};

/** A transparent oxide to begin with, until the real one is chosen. */
const FIRST_OXIDE: StackMedium = { index: [2.3, 0], label: 'oxide' };

/** One layer of a real sample. */
export function LayerForm({ document, layer, edit, nameOf, isMagnetic, hasAxes, pickMedium }: Props) {
  const name = nameOf(layer.medium);
  const change = (patch: Parameters<typeof withSample>[2], what: string | null) =>
    edit((now) => withSample(now, layer.id, patch), what && `${what} of ${layer.id}`);
  const changeMedium = (medium: StackMedium) =>
    edit((now) => {
      const changed = withSample(now, layer.id, { medium });
      return isMagnetic(medium) ? magnetized(changed, layer.id) : changed;
    }, null);
  const { dead = { topNm: 0, bottomNm: 0 }, oxide } = layer;
  const liveNm = layer.thicknessNm - (oxide?.consumedNm ?? 0);
  return (
    <>
      <Row label="Graded interface above">
        <SampleQuantity
          label={`width of the graded interface above ${name}`}
          unit="nm"
          value={layer.gradedNm ?? 0}
          onChange={(gradedNm) => change({ gradedNm }, 'graded')}
        />
      </Row>
      {layer.m && (
        <Row label="Magnetically dead at">
          {(['topNm', 'bottomNm'] as const).map((side) => (
            <span key={side} className="inline-flex items-center">
              {side === 'topNm' ? 'top' : 'bottom'}
              <SampleQuantity
                label={`dead ${side === 'topNm' ? 'top' : 'bottom'} of ${name}`}
                unit="nm"
                value={dead[side]}
                max={Math.max(0, liveNm - dead[side === 'topNm' ? 'bottomNm' : 'topNm'])}
                onChange={(value) => change({ dead: { ...dead, [side]: value } }, `dead ${side}`)}
              />
            </span>
          ))}
        </Row>
      )}
      <Check
        label="Oxidised at its top"
        checked={oxide !== undefined}
        onChange={(on) => {
          const consumedNm = Math.min(1, layer.thicknessNm);
          change({ oxide: on ? { medium: FIRST_OXIDE, consumedNm, expansion: 1.7 } : undefined }, null);
        }}
      />
      {oxide && (
        <div className="ml-5 flex flex-col gap-1">
          <Row label="Oxide">
            {pickMedium({
              medium: oxide.medium,
              label: `the oxide of ${name}`,
              onChange: (medium) => change({ oxide: { ...oxide, medium } }, null),
            })}
          </Row>
          <Row label={`${name} consumed`}>
            <SampleQuantity
              label={`${name} consumed`}
              unit="nm"
              value={oxide.consumedNm}
              max={Math.max(0, layer.thicknessNm - dead.topNm - dead.bottomNm)}
              onChange={(consumedNm) => change({ oxide: { ...oxide, consumedNm } }, 'consumed')}
            />
          </Row>
          <Row label="Expansion, oxide over metal">
            <SampleQuantity
              label="expansion, oxide over metal"
              unit="×"
              min={0.1}
              max={10}
              value={oxide.expansion}
              onChange={(expansion) => change({ oxide: { ...oxide, expansion } }, 'expansion')}
            />
          </Row>
          <p className="text-small text-muted">{oxideText(layer, name, nameOf(oxide.medium))}</p>
        </div>
      )}
      {layer.medium.mixture ? (
        <MixtureForm
          mixture={layer.medium.mixture}
          nameOf={nameOf}
          pickMedium={pickMedium}
          onChange={(medium) => changeMedium(medium)}
        />
      ) : (
        !hasAxes(layer.medium) && (
          <button
            type="button"
            className="w-fit rounded-box text-accent hover:underline"
            onClick={() => changeMedium(mixedWith(layer.medium, document.incident))}
          >
            Make {name} a mixture of two media
          </button>
        )
      )}
      {hasAxes(layer.medium) && (
        <AxesRow medium={layer.medium} name={name} onChange={(medium, what) => change({ medium }, what)} />
      )}
    </>
  );
}

/** A medium that has become magnetic arrives with an m, or nothing would show what it does. */
function magnetized(document: StackDocument, id: string): StackDocument {
  const visit = (items: StackDocument['layers']): StackDocument['layers'] =>
    items.map((item) => {
      if ('layers' in item) return { ...item, layers: visit(item.layers) };
      return item.id === id && item.m === undefined ? { ...item, m: [0, 0, 1] } : item;
    });
  return { ...document, layers: visit(document.layers) };
}
