import { cardLayerCells } from '../../../../shared/cardWords.ts';
import type { CardLayer } from '../../../../shared/growthCard.ts';

const numbers = 'py-1 pl-3 text-right whitespace-nowrap';

/** The film in the order of growth, with room to write what became of it. */
export function CardLayerTable({ layers }: { layers: readonly CardLayer[] }) {
  return (
    // The words for screen readers are placed in it, so that they do not widen the page on a phone.
    <div
      className="relative overflow-x-auto"
      tabIndex={0}
      role="region"
      aria-label="Film in the order of growth"
    >
      <table className="w-full min-w-[560px] text-left text-note">
        <caption className="sr-only">Layers in the order of growth, the substrate first</caption>
        <thead className="border-b border-edge text-small text-muted">
          <tr>
            <th scope="col" className="pr-2 font-medium">
              step
            </th>
            <th scope="col" className="font-medium">
              material
            </th>
            {['nominal nm', 'deviation nm', 'rate nm/min', 'time s'].map((name) => (
              <th key={name} scope="col" className="pl-3 text-right font-medium">
                {name}
              </th>
            ))}
            <th scope="col" className="w-28 pl-3 font-medium">
              as grown nm
            </th>
          </tr>
        </thead>
        <tbody>
          {layers.map((layer, index) => {
            const cells = cardLayerCells(layer);
            const opens = layer.block !== null && layers[index - 1]?.block !== layer.block;
            return [
              opens && (
                <tr key={`block ${index}`}>
                  <td />
                  <td colSpan={6} className="pt-1 text-small text-muted">
                    {layer.block}
                  </td>
                </tr>
              ),
              <tr key={index} className="border-b border-line align-baseline">
                <td className="py-1 pr-2">{cells.step}</td>
                <th scope="row" className="py-1 font-semibold">
                  {cells.material}
                  {cells.role && <span className="font-normal text-muted"> {cells.role}</span>}
                </th>
                <td className={`${numbers} font-semibold`}>{cells.thickness}</td>
                <td className={numbers}>{cells.deviation}</td>
                {layer.step === null ? (
                  <td colSpan={3} />
                ) : (
                  <>
                    <Fill text={cells.rate} />
                    <Fill text={cells.time} />
                    <Fill text="" />
                  </>
                )}
              </tr>,
            ];
          })}
        </tbody>
      </table>
    </div>
  );
}

/** A cell that is filled in by hand where nothing is known. */
function Fill({ text }: { text: string }) {
  return (
    <td className={numbers}>
      {text === '' ? (
        <span className="inline-block w-14 border-b border-dotted border-edge">
          <span className="sr-only">to fill in</span>&nbsp;
        </span>
      ) : (
        text
      )}
    </td>
  );
}
