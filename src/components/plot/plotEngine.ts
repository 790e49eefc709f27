import { CustomChart, LineChart, ScatterChart } from 'echarts/charts';
import { GridComponent, MarkPointComponent } from 'echarts/components';
import * as echarts from 'echarts/core';
import type { EChartsCoreOption } from 'echarts/core';
import { CanvasRenderer, SVGRenderer } from 'echarts/renderers';

// Only what a line plot needs, so that the rest of the library stays out of the bundle.
echarts.use([
  CustomChart,
  LineChart,
  ScatterChart,
  GridComponent,
  MarkPointComponent,
  CanvasRenderer,
  SVGRenderer,
]);

export { echarts };

/** The figure drawn afresh as an SVG document, for a file. */
export function renderSvg(option: EChartsCoreOption, size: { width: number; height: number }): string {
  const chart = echarts.init(null, null, { renderer: 'svg', ssr: true, ...size });
  try {
    chart.setOption(option);
    return chart.renderToSVGString();
  } finally {
    // A chart that is not disposed of keeps its timers for ever.
    chart.dispose();
  }
}

/** The figure as a PNG at twice its size on screen. */
export async function renderPng(
  option: EChartsCoreOption,
  size: { width: number; height: number },
  background: string,
): Promise<Blob> {
  const canvas = document.createElement('canvas');
  const chart = echarts.init(canvas, null, { renderer: 'canvas', devicePixelRatio: 2, ...size });
  try {
    chart.setOption({ ...option, backgroundColor: background });
    chart.getZr().flush();
    return await new Promise<Blob>((resolve, reject) => {
      canvas.toBlob((blob) => {
        if (blob) resolve(blob);
        else reject(new Error('The browser could not make the picture. Try the SVG file.'));
      }, 'image/png');
    });
  } finally {
    chart.dispose();
  }
}
