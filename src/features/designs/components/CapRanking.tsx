import { useMemo } from 'react';
import type { ReactNode } from 'react';
import type { CapDesign, CapOutcome, CapResult } from '../../../../shared/capDesign.ts';
import { DataTable } from '../../../components/DataTable.tsx';
import type { Column } from '../../../components/DataTable.tsx';
import { formatNumber } from '../../../lib/format.ts';
import { printQuantity, readingQuantities, signalQuantities } from '../model/quantities.ts';
import { windowWords } from '../model/windowWords.ts';

type Props = {
  input: CapDesign;
  result: CapResult;
  pointId: string;
  actions?: (candidateId: string) => ReactNode;
};

type Row = {
  outcome: CapOutcome;
  /** From 1. */
  rank: number;
  at: NonNullable<CapOutcome['best']>['points'][number] | undefined;
};

/** The candidates from the best to the worst, with why each one is as thick as it is or what keeps it out. */
export function CapRanking({ input, result, pointId, actions }: Props) {
  const rows = useMemo(
    () =>
      result.ranking.flatMap((id, position): Row[] => {
        const outcome = result.candidates.find((one) => one.id === id);
        if (!outcome) return [];
        const at = outcome.best?.points.find((one) => one.pointId === pointId);
        return [{ outcome, rank: position + 1, at }];
      }),
    [result, pointId],
  );
  const columns = useMemo(() => columnsOf(input, actions), [input, actions]);
  return (
    <section aria-labelledby="ranking-heading">
      <h2 id="ranking-heading" className="mb-2 text-lead">
        Candidates in order
      </h2>
      <div className="card @container">
        <DataTable
          caption="Candidates from the best to the worst"
          columns={columns}
          rows={rows}
          rowKey={({ outcome }) => outcome.id}
          empty={null}
          initialSort={{ id: 'rank', descending: false }}
        />
        {/* Where the table has no room for sentences, as in a study, they stand under it. */}
        <ul className="hidden border-t border-line px-3 py-2 text-note md:@max-4xl:block">
          {rows.map(({ outcome }) => (
            <li key={outcome.id} className="py-0.5">
              <b className="font-semibold">{outcome.label}</b>{' '}
              <span className="text-muted">{outcome.best?.reason ?? outcome.obstacle}</span>
            </li>
          ))}
        </ul>
      </div>
    </section>
  );
}

function columnsOf(input: CapDesign, actions: Props['actions']): Column<Row>[] {
  const signal = signalQuantities[input.signal];
  const percent = (value: number | null | undefined, unit: string) =>
    value === null || value === undefined ? '–' : `${formatNumber(value, { digits: 3 })}\u00a0${unit}`;
  return [
    {
      id: 'cap',
      header: 'Cap',
      value: ({ outcome }) => outcome.label,
      cell: ({ outcome }) => (
        <div className="max-w-96">
          {outcome.label}
          <div className="text-note font-normal text-muted md:@max-4xl:hidden">
            {outcome.best?.reason ?? outcome.obstacle}
          </div>
          {outcome.best && actions ? <div className="mt-1.5 font-normal">{actions(outcome.id)}</div> : null}
        </div>
      ),
    },
    { id: 'rank', header: 'Rank', align: 'end', value: ({ rank }) => rank },
    {
      id: 'best',
      header: 'Thickness',
      align: 'end',
      value: ({ outcome }) => outcome.best?.thicknessNm ?? null,
      cell: ({ outcome }) =>
        outcome.best ? `${formatNumber(outcome.best.thicknessNm, { digits: 3 })} nm` : 'none',
    },
    {
      id: 'signal',
      header: 'Signal',
      align: 'end',
      value: ({ at }) => at?.signal ?? null,
      cell: ({ at }) =>
        at ? (
          <div>
            {printQuantity(signal, at.signal)}
            <div className="text-note whitespace-nowrap text-muted">
              {printQuantity({ ...signal, unit: '' }, at.signalLow, 3)} to{' '}
              {printQuantity({ ...signal, unit: '' }, at.signalHigh, 3)}
            </div>
          </div>
        ) : (
          '–'
        ),
    },
    {
      id: 'cost',
      header: 'Cost',
      align: 'end',
      value: ({ at }) => at?.costPercent ?? null,
      cell: ({ at }) => percent(at?.costPercent, '%'),
    },
    {
      id: 'slope',
      header: 'Change',
      align: 'end',
      value: ({ at }) => at?.slopePercentPerNm ?? null,
      cell: ({ at }) => percent(at?.slopePercentPerNm, '%/nm'),
    },
    {
      id: 'ceiling',
      header: 'Of the ceiling',
      align: 'end',
      value: ({ at }) => at?.readings.ceilingShare ?? null,
      cell: ({ at }) => printQuantity(readingQuantities.ceilingShare, at?.readings.ceilingShare ?? null, 3),
    },
    {
      id: 'yield',
      header: 'Yield',
      align: 'end',
      value: ({ outcome }) => outcome.best?.yield ?? null,
      cell: ({ outcome }) => percent(outcome.best && 100 * outcome.best.yield, '%'),
    },
    {
      id: 'window',
      header: 'Window',
      value: ({ outcome }) => outcome.windows[0]?.fromNm ?? null,
      cell: ({ outcome }) => windowWords(outcome.windows) || 'none',
    },
  ];
}
