import type { Issue } from '../../shared/error.ts';
import type { CapCandidate } from '../../shared/capDesign.ts';

/** Where a field of the film at a working point stands in the request: the point's, or the film's. */
export function designPath(path: string, point: number, before = 'input.'): string {
  return /^document\.workingPoint\b/.test(path)
    ? `${before}points[${point}].${path.slice('document.'.length)}`
    : `${before}${path}`;
}

export function toDesignIssues(issues: Issue[], point: number, before?: string): Issue[] {
  return issues.map(({ path, message }) => ({ path: designPath(path, point, before), message }));
}

/** ... and a field of a candidate's own layers (`candidateAlone`). */
export function candidatePath(path: string, candidate: number, layers: CapCandidate['layers']): string {
  const layer = /^document\.layers\[(\d+)\]/.exec(path);
  const named = layer && layers[Number(layer[1])]?.medium.material !== undefined;
  // What cannot be said of a constant is said of the material that was chosen.
  const field = named && path.endsWith('.medium') ? `${path}.material` : path;
  return `input.candidates[${candidate}].${field.slice('document.'.length)}`;
}

/** Each problem once, at the first working point that has it. */
export function eachOnce<Found extends { path: string; message: string }>(found: Found[]): Found[] {
  const seen = new Set<string>();
  return found.filter(({ path, message }) => {
    const key = `${path}\n${message}`;
    return seen.has(key) ? false : seen.add(key);
  });
}
