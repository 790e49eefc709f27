import type { LiveCurveRequest } from '../../../../shared/live.ts';
import { decodeResult } from '../../../../shared/resultFormat.ts';
import type { RunResult } from '../../../../shared/resultFormat.ts';
import { requestBinary } from '../../../lib/apiClient.ts';

/** One curve of a film as it is on the page; nothing is stored. */
export async function liveCurve(body: LiveCurveRequest, signal: AbortSignal): Promise<RunResult> {
  return decodeResult(await requestBinary({ path: '/live-curve', body, signal }));
}
