// @vitest-environment jsdom
import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { MapPlot } from './MapPlot.tsx';
import type { MapData } from './mapTypes.ts';

afterEach(cleanup);

const data: MapData = {
  x: [0, 30, 60],
  y: [500, 600],
  values: [1, 2, 3, 4, NaN, 6],
};

function show(onCursor?: () => void) {
  render(
    <MapPlot
      data={data}
      xAxis={{ label: 'angle (deg)', format: (value) => `${value}°` }}
      yAxis={{ label: 'wavelength (nm)', format: (value) => `${value} nm` }}
      value={{ name: 'rotation', tone: 'rotation', axis: { label: 'mdeg', format: (v) => `${v} mdeg` } }}
      height={300}
      marker={{ x: 30, y: 500 }}
      fileName="map"
      renderer="svg"
      {...(onCursor ? { onCursor } : {})}
    />,
  );
  return screen.getByRole('slider', { name: 'rotation: read values of the map' });
}

describe('MapPlot', () => {
  it('says its extremes and reads values along both axes by keyboard', async () => {
    const user = userEvent.setup();
    const onCursor = vi.fn();
    const map = show(onCursor);
    expect(screen.getByText(/least 1 mdeg at 0°, 500 nm, largest 6 mdeg at 60°, 600 nm/)).toBeTruthy();
    map.focus();
    await user.keyboard('{ArrowRight}');
    expect(map.getAttribute('aria-valuetext')).toBe('30°, 500 nm: rotation 2 mdeg');
    await user.keyboard('{ArrowRight}');
    expect(map.getAttribute('aria-valuetext')).toBe('60°, 500 nm: rotation 3 mdeg');
    await user.keyboard('{ArrowUp}{ArrowLeft}');
    expect(map.getAttribute('aria-valuetext')).toBe('30°, 600 nm: rotation no value');
    expect(onCursor).toHaveBeenLastCalledWith({ ix: 1, iy: 1 });
    await user.keyboard('{Escape}');
    expect(onCursor).toHaveBeenLastCalledWith(null);
  });

  it('cuts along either axis where Enter says', async () => {
    const user = userEvent.setup();
    const map = show();
    expect(screen.getByText(/at 500 nm; click the map/)).toBeTruthy();
    map.focus();
    await user.keyboard('{ArrowRight}{ArrowUp}{Enter}');
    expect(screen.getByText(/at 600 nm; click the map/)).toBeTruthy();
    await user.selectOptions(screen.getByRole('combobox', { name: /cut along/ }), 'wavelength (nm)');
    expect(screen.getByRole('slider', { name: /Cut through the map along wavelength/ })).toBeTruthy();
    expect(screen.getByText(/at 30°; click the map/)).toBeTruthy();
  });
});
