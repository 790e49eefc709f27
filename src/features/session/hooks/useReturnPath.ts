import { useSearchParams } from 'react-router-dom';
import { paths } from '../../../lib/paths.ts';

/** Where to go after signing in. Only addresses of this site: `//elsewhere` would be another one. */
export function useReturnPath(): string {
  const [search] = useSearchParams();
  const asked = search.get('return');
  return asked && /^\/(?![/\\])/.test(asked) ? asked : paths.start;
}
