import { magnetizationAt } from '../../../../shared/thermal.ts';
import type { ThermalLaw } from '../../../../shared/thermal.ts';
import { formatNumber, formatPlain } from '../../../lib/format.ts';
import { Law } from './Law.tsx';

/** K; where most constants were measured. */
const ROOM = 295;

/** How the magnetization of this material falls with temperature. */
export function ThermalNote({ law }: { law: ThermalLaw }) {
  const { curieK, a, b, citation } = law;
  return (
    <div className="flex flex-col gap-2">
      <Law
        law={`m(T) = (1 − (T / Tc)ᵃ)ᵇ; at ${ROOM} K it is ${formatNumber(magnetizationAt(ROOM, law), { digits: 3 })} of its value at 0 K. A layer uses it only where its temperature is set.`}
        parameters={[
          { name: 'Tc', value: `${formatPlain(curieK)} K` },
          { name: 'a', value: formatPlain(a) },
          { name: 'b', value: formatPlain(b) },
        ]}
      />
      <p className="text-note text-muted">Source: {citation}</p>
    </div>
  );
}
