// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, expect, it, vi } from 'vitest';
import type { SweepAxis } from '../../../../shared/run.ts';
import { sweepXAxis } from '../../../components/plot/readingSeries.ts';
import { buildLoadedRun, compare } from '../compareFixtures.ts';
import { comparedMaps } from '../model/mapDifference.ts';
import { CompareMaps } from './CompareMaps.tsx';

afterEach(cleanup);

const angle: SweepAxis = { kind: 'angle', from: 0, to: 40, points: 3, spacing: 'linear' };
const wavelength: SweepAxis = { kind: 'wavelength', from: 400, to: 800, points: 3, spacing: 'linear' };

it('reads both maps and their difference at the same place, by keyboard', async () => {
  const user = userEvent.setup();
  const [a, b, c] = [1, 1.5, 3].map((factor, index) =>
    buildLoadedRun('ABC'.charAt(index), { axis: angle, second: wavelength }, (deg) => (factor * deg) / 1000),
  );
  const { runs, reference } = compare([a!, b!, c!]);
  const maps = comparedMaps(runs, reference, 'rotationP')!;
  const onShown = vi.fn();
  render(
    <CompareMaps
      base={maps.base}
      others={maps.others}
      shown={maps.others[0]!}
      onShown={onShown}
      axes={{ x: sweepXAxis(angle), y: sweepXAxis(wavelength) }}
      reading="rotationP"
      relation="difference"
      held={[]}
      unit="mdeg"
      height={300}
      onRelation={() => undefined}
      controls={null}
      renderer="svg"
    />,
  );
  const map = (name: RegExp) => screen.getByRole('slider', { name });
  map(/^B: rotation p: read/).focus();
  // Begins to read, goes to 0 deg and on to 20 deg.
  await user.keyboard('{ArrowRight}{Home}{ArrowRight}');
  // f deg at 20 deg, by hand: 20, 30 and their difference.
  expect(map(/^A: rotation p: read/).getAttribute('aria-valuetext')).toBe(
    '20°, 600 nm: A: rotation p +20.00 mdeg',
  );
  expect(map(/^B: rotation p: read/).getAttribute('aria-valuetext')).toBe(
    '20°, 600 nm: B: rotation p +30.00 mdeg',
  );
  expect(map(/^B − A: read/).getAttribute('aria-valuetext')).toBe('20°, 600 nm: B − A +10.00 mdeg');
  await user.selectOptions(screen.getByRole('combobox', { name: 'Map beside the reference' }), 'C');
  expect(onShown).toHaveBeenLastCalledWith('C');
});
