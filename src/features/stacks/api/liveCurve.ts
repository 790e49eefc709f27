import type { LiveCurveRequest } from '../../../../shared/live.ts';
import type { ReadingsStrip } from '../../../../shared/readingsStrip.ts';
import { decodeResult } from '../../../../shared/resultFormat.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import { requestBinary } from '../../../lib/apiClient.ts';

export type LiveCurve = Pick<RunResult, 'columns'> & { strip: ReadingsStrip | null };

/** One curve of a film as it is on the page; nothing is stored. */
export async function liveCurve(body: LiveCurveRequest, signal: AbortSignal): Promise<LiveCurve> {
  const { columns, header } = decodeResult(await requestBinary({ path: '/live-curve', body, signal }));
  return { columns, strip: header.strip ?? null };
}
