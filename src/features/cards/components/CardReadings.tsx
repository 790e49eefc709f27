import { cardReadingCells } from '../../../../shared/cardWords.ts';
import type { CardReading } from '../../../../shared/growthCard.ts';

/** What the film should show at each working point, with the band in which two of three films lie. */
export function CardReadings({ readings }: { readings: readonly CardReading[] }) {
  return (
    <div className="grid gap-x-8 gap-y-3 group-data-paper:grid-cols-2 sm:grid-cols-2">
      {readings.map(({ pointId, label, conditions, readings: values }) => (
        <table key={pointId} className="w-full self-start text-left text-note">
          <caption className="text-left">
            <span className="font-semibold">{label}</span> <span className="text-muted">{conditions}</span>
          </caption>
          <thead className="sr-only">
            <tr>
              <th scope="col">Reading</th>
              <th scope="col">Nominal</th>
              <th scope="col">Band</th>
            </tr>
          </thead>
          <tbody>
            {values.map((reading) => {
              const cells = cardReadingCells(reading);
              return (
                <tr key={reading.label} className="border-t border-line">
                  <th scope="row" className="py-0.5 font-normal">
                    {cells.label}
                  </th>
                  <td className="py-0.5 pl-3 text-right font-semibold whitespace-nowrap">
                    {cells.nominal} {cells.unit}
                  </td>
                  <td className="py-0.5 pl-3 text-right sm:whitespace-nowrap">{cells.band}</td>
                </tr>
              );
            })}
          </tbody>
        </table>
      ))}
    </div>
  );
}
