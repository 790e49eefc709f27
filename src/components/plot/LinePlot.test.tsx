// @vitest-environment jsdom
import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { LinePlot } from './LinePlot.tsx';
import type { PlotSeries } from './plotTypes.ts';

afterEach(cleanup);

const x = Array.from({ length: 91 }, (_, index) => index);
const series: PlotSeries[] = [
  { name: 'rotation', x, y: x.map((value) => value / 2), tone: 'rotation', format: (v) => `${v} mdeg` },
  {
    name: 'ellipticity',
    x,
    y: x.map((value) => -value),
    tone: 'ellipticity',
    dash: 'dashed',
    symbol: 'open',
  },
];

function show(onPickX?: (x: number) => void) {
  render(
    <LinePlot
      series={series}
      xAxis={{ label: 'angle of incidence (deg)', format: (value) => `${value}°` }}
      yAxes={[{ label: 'mdeg', format: (value) => `${value} mdeg` }]}
      height={300}
      ariaLabel="Kerr angles against angle"
      marker={60}
      {...(onPickX ? { onPickX } : {})}
      renderer="svg"
    />,
  );
  return screen.getByRole('slider');
}

describe('LinePlot', () => {
  it('draws the curves with their names at them and no legend', async () => {
    show();
    await waitFor(() => expect(document.querySelector('svg text')).not.toBeNull());
    const texts = [...document.querySelectorAll('svg text')].map((node) => node.textContent);
    expect(texts).toContain('rotation');
    expect(texts).toContain('ellipticity');
    expect(texts).toContain('angle of incidence (deg)');
  });

  it('reads every curve by keyboard and announces it', async () => {
    const user = userEvent.setup();
    const slider = show();
    slider.focus();
    await user.keyboard('{ArrowRight}');
    expect(slider.getAttribute('aria-valuetext')).toBe('60°: rotation 30 mdeg, ellipticity -60 mdeg');
    await user.keyboard('{ArrowRight}{ArrowRight}{ArrowLeft}');
    expect(slider.getAttribute('aria-valuenow')).toBe('61');
    await user.keyboard('{End}');
    expect(slider.getAttribute('aria-valuenow')).toBe('90');
  });

  it('sets the working point by Enter and by a click', async () => {
    const user = userEvent.setup();
    const onPickX = vi.fn();
    const slider = show(onPickX);
    slider.focus();
    await user.keyboard('{Home}{Enter}');
    expect(onPickX).toHaveBeenLastCalledWith(0);
    // Without layout the figure is 760 px wide at the left of the page: its frame runs from 56 to 742.
    fireEvent.pointerDown(slider, { button: 0, clientX: 399 });
    fireEvent.pointerUp(slider, { button: 0, clientX: 399 });
    expect(onPickX.mock.lastCall?.[0]).toBeCloseTo(45);
  });

  it('zooms to a dragged part and back', async () => {
    const user = userEvent.setup();
    const slider = show(vi.fn());
    expect(screen.getByRole('button', { name: 'Show the whole range' })).toHaveProperty('disabled', true);
    fireEvent.pointerDown(slider, { button: 0, clientX: 399 });
    fireEvent.pointerMove(slider, { clientX: 742 });
    fireEvent.pointerUp(slider, { button: 0, clientX: 742 });
    expect(Number(slider.getAttribute('aria-valuemin'))).toBeCloseTo(45);
    await user.click(screen.getByRole('button', { name: 'Show the whole range' }));
    expect(slider.getAttribute('aria-valuemin')).toBe('0');
  });
});
