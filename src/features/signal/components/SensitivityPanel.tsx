import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { StackDocument, WorkingPoint } from '../../../../shared/stack.ts';
import { formatAngle, formatNumber, formatPlain } from '../../../lib/format.ts';
import type { AngleUnit } from '../../../lib/format.ts';
import { useSettled } from '../../../lib/useSettled.ts';
import { sensitivityQuery } from '../api/sensitivity.ts';
import { sensitivityRows } from '../model/sensitivityRows.ts';

type Props = { document: StackDocument; stale: boolean; point: WorkingPoint; unit: AngleUnit };

/** The derivatives follow when the typing has stopped. */
const PAUSE_MS = 300;

/** What the readings hang on, the most important parameter first. */
export function SensitivityPanel({ document, stale, point, unit }: Props) {
  const asked = useMemo(
    () => ({ document, points: [{ id: 'point', label: 'Working point', workingPoint: point }] }),
    [document, point],
  );
  const settled = useSettled(asked, PAUSE_MS);
  const { data, error, isFetching } = useQuery({
    ...sensitivityQuery(settled),
    placeholderData: keepPreviousData,
    retry: false,
  });
  const rows = useMemo(() => (data ? sensitivityRows(data.sensitivities) : null), [data]);
  if (error && settled === asked) return <p className="text-note text-danger">{error.message}</p>;
  if (rows === null) {
    return (
      <p role="status" className="py-4 text-center text-note text-muted">
        Taking the derivatives
      </p>
    );
  }
  const pending = stale || isFetching || settled !== asked;
  const angle = (value: number | null) => (value === null ? '–' : formatAngle(value, unit));
  const number = (value: number | null) => (value === null ? '–' : formatNumber(value, { signed: true }));
  return (
    <div className="overflow-x-auto" aria-busy={pending}>
      <table className={`w-full min-w-[620px] text-left text-note ${pending ? 'opacity-55' : ''}`}>
        <caption className="pb-1 text-left text-small text-muted">
          Derivatives at the working point: of a thickness per nm, of n, k and Q per 1. Sorted by the change
          of rotation when the parameter grows by 1 % of its value.
        </caption>
        <thead className="text-small text-muted">
          <tr>
            <th scope="col" className="font-medium">
              parameter
            </th>
            {[
              'value',
              `rotation by 1 % (${unit})`,
              `rotation (${unit})`,
              `ellipticity (${unit})`,
              'cross amplitude',
              'reflectance',
            ].map((name) => (
              <th key={name} scope="col" className="pl-3 text-right font-medium">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ parameter, of, label, value, derivative, rotationPerPercentDeg }) => (
            <tr key={`${parameter} ${of}`} className="border-t border-line">
              <th scope="row" className="py-1 font-normal">
                {label}
              </th>
              {[
                formatPlain(Number(value.toPrecision(6))) + (parameter === 'thickness' ? ' nm' : ''),
                angle(rotationPerPercentDeg),
                angle(derivative.rotationDeg),
                angle(derivative.ellipticityDeg),
                number(derivative.amplitude),
                number(derivative.reflectance),
              ].map((text, index) => (
                <td
                  key={index}
                  className={`py-1 pl-3 text-right whitespace-nowrap ${index === 1 ? 'font-semibold' : ''}`}
                >
                  {text}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
