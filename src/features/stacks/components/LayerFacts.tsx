import type { StackLayer } from '../../../../shared/stack.ts';
import { isFreeTensor } from '../model/media.ts';
import { thermalWords } from '../model/thermalWords.ts';
import { useFilm } from './film.ts';

/** What else is true of a layer, in words: its temperature, how its axes are turned, a tensor's own magnetization. */
export function LayerFacts({ layer }: { layer: StackLayer }) {
  const { materials } = useFilm();
  const { medium, thermal } = layer;
  const turned = medium.orientationDeg?.some((angle) => angle !== 0) ? medium.orientationDeg : null;
  const facts = [
    ...(thermal ? [thermalWords(thermal)] : []),
    ...(isFreeTensor(medium, materials) ? ['a free tensor: it carries its own magnetization'] : []),
    ...(turned ? [`axes turned ${turned.map((angle) => `${angle}°`).join(', ')}`] : []),
  ];
  if (facts.length === 0) return null;
  return (
    <p className="mx-2 mb-1 w-fit rounded-box bg-paper/85 px-2 text-small text-ink">{facts.join('; ')}</p>
  );
}
