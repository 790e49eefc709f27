import type { EChartsCoreOption } from 'echarts/core';
import { bandOption } from './plotBand.ts';
import { formatTick } from './niceScale.ts';
import type { PlotLayout } from './plotLayout.ts';
import { fromPixel, onScale } from './plotScale.ts';
import type { PlotTokens } from './plotTokens.ts';
import type { PlotAxis, PlotSeries } from './plotTypes.ts';

const FONT = '"Roboto Flex Variable", "Roboto Flex", sans-serif';
/** How far the name of a right axis reaches beyond the frame, px: as far as its numbers do. */
const RIGHT_NAME = 50;
/** Letters of a name that fits beside a right axis. */
const SHORT_NAME = 5;
/** Open markers along one curve. */
const MARKERS = 14;
const dashes = { solid: 'solid', dashed: [7, 4], dotted: [1.5, 3.5] } as const;

/**
 * The figure as an ECharts option. Axes are linear in what plotScale.ts says and carry their own ticks, so that
 * the overlay (crosshair, working point) and the canvas agree to the pixel.
 */
export function plotOption(
  layout: PlotLayout,
  series: readonly PlotSeries[],
  xAxis: PlotAxis,
  yAxes: readonly PlotAxis[],
  size: { width: number; height: number },
  tokens: PlotTokens,
): EChartsCoreOption {
  const { frame } = layout;
  return {
    animation: false,
    textStyle: { fontFamily: FONT, fontSize: 12, color: tokens.muted },
    grid: {
      // The overlay is laid over exactly this frame: a wide axis name must not move it.
      outerBoundsMode: 'none',
      left: frame.left,
      top: frame.top,
      right: size.width - frame.right,
      bottom: size.height - frame.bottom,
    },
    xAxis: {
      id: 'x',
      ...axisOption(layout.x, tokens),
      name: xAxis.label,
      nameLocation: 'middle',
      nameGap: 30,
      nameTextStyle: { color: tokens.muted },
      splitLine: { show: false },
      axisLine: { show: true, onZero: false, lineStyle: { color: tokens.line } },
    },
    yAxis: yAxes.map((axis, index) => ({
      ...axisOption(layout.y[index]!, tokens),
      id: `y ${index}`,
      position: index === 0 ? 'left' : 'right',
      offset: index === 0 ? 0 : (index - 1) * 54,
      name: axis.label,
      nameGap: 10,
      nameTextStyle: {
        color: tokens.muted,
        fontSize: 11.5,
        // Over the numbers, clear of the working point's handle on the frame; a long name on the right ends at the edge.
        ...(index > 0 && axis.label.length <= SHORT_NAME
          ? { align: 'left', padding: [0, 0, 0, 8] }
          : { align: 'right', padding: index === 0 ? [0, 8, 0, 0] : [0, -RIGHT_NAME, 0, 0] }),
      },
      splitLine: { show: index === 0, lineStyle: { color: tokens.line } },
      axisLine: { show: false },
    })),
    series: [
      ...series.flatMap((one, index) => bandOption(one, index, layout, tokens)),
      ...series.flatMap((one, index) => seriesOption(one, index, layout, tokens)),
      ...zeroLine(layout, tokens),
    ],
  };
}

/** The zero of the left axis, where it lies inside the figure: the sign of an angle is read against it. */
function zeroLine({ x, y }: PlotLayout, tokens: PlotTokens): object[] {
  const left = y[0];
  if (!left || left.log || !(left.min < 0 && left.max > 0)) return [];
  const ends = [x.min, x.max].map((value) => [onScale(value, x.log), 0]);
  return [
    {
      type: 'line',
      id: 'zero',
      data: ends,
      showSymbol: false,
      silent: true,
      z: 1,
      lineStyle: { color: tokens.muted, width: 1, opacity: 0.55 },
    },
  ];
}

function axisOption(scale: PlotLayout['x'], tokens: PlotTokens) {
  const places = scale.ticks.map((tick) => onScale(tick, scale.log));
  return {
    type: 'value',
    min: onScale(scale.min, scale.log),
    max: onScale(scale.max, scale.log),
    axisTick: { show: false, customValues: places },
    axisLabel: {
      color: tokens.muted,
      customValues: places,
      hideOverlap: true,
      formatter: (place: number) => {
        const nearest = places.reduce((best, one, index) => {
          return Math.abs(one - place) < Math.abs(places[best]! - place) ? index : best;
        }, 0);
        return formatTick(scale.ticks[nearest] ?? 0, scale.ticks);
      },
    },
  };
}

function seriesOption(series: PlotSeries, index: number, layout: PlotLayout, tokens: PlotTokens): object[] {
  const axisIndex = series.yAxisIndex ?? 0;
  const [xScale, yScale] = [layout.x, layout.y[axisIndex]!];
  const color = tokens[series.tone];
  const curve = layout.drawn[index]!;
  const points = curve.x.map((x, sample) => [onScale(x, xScale.log), onScale(curve.y[sample]!, yScale.log)]);
  const label = layout.labels[index];
  const line = {
    type: 'line',
    id: `line ${index}`,
    name: series.name,
    yAxisIndex: axisIndex,
    data: points,
    // A lone sample has no line: it is drawn as a dot.
    showSymbol: points.length === 1,
    symbol: 'circle',
    symbolSize: 7,
    lineStyle: { color, width: series.width ?? 2, type: dashes[series.dash ?? 'solid'], cap: 'butt' },
    itemStyle: { color },
    silent: true,
    clip: true,
    markPoint: label && {
      symbol: 'circle',
      symbolSize: 0.01,
      silent: true,
      data: [
        {
          coord: [
            onScale(fromPixel(xScale, label.x), xScale.log),
            onScale(fromPixel(yScale, label.y - 7), yScale.log),
          ],
        },
      ],
      label: {
        formatter: series.name,
        position: 'inside',
        color,
        fontFamily: FONT,
        fontSize: 12,
        fontWeight: 600,
        textBorderColor: tokens.panel,
        textBorderWidth: 3,
      },
    },
  };
  const marks = (name: string, data: number[][], symbolSize: number) => ({
    type: 'scatter',
    id: `${name} ${index}`,
    name: `${series.name} (${name})`,
    yAxisIndex: axisIndex,
    data,
    symbol: 'circle',
    symbolSize,
    itemStyle: { color: tokens.panel, borderColor: color, borderWidth: 1.5 },
    silent: true,
    clip: true,
  });
  const parts: object[] = [line];
  if (series.symbol === 'open') parts.push(marks('markers', markerSamples(points), 6.5));
  if (series.points) {
    const { x, y } = series.points;
    const samples = Array.from(x, (at, sample) => [onScale(at, xScale.log), onScale(y[sample]!, yScale.log)]);
    parts.push(marks('samples', samples, samples.length > 80 ? 3.5 : 5));
  }
  return parts;
}

/** Samples at about equal distances along x. */
function markerSamples(points: number[][]): number[][] {
  const finite = points.filter((point) => point.every(Number.isFinite));
  if (finite.length <= MARKERS) return finite;
  const [first, last] = [finite[0]![0]!, finite[finite.length - 1]![0]!];
  const chosen: number[][] = [];
  let position = 0;
  for (let marker = 0; marker < MARKERS; marker++) {
    const target = first + ((marker + 0.5) / MARKERS) * (last - first);
    while (position < finite.length - 1 && (finite[position]![0]! - target) * (last - first) < 0) position++;
    chosen.push(finite[position]!);
  }
  return chosen;
}
