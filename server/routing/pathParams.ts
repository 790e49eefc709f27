import { notFound } from '../errors.ts';

type ParamNames<Path extends string> = Path extends `${string}:${infer Rest}`
  ? Rest extends `${infer Name}/${infer Tail}`
    ? Name | ParamNames<Tail>
    : Rest
  : never;

/** The parameters of a path such as "/groups/:groupId/members/:userId". */
export type PathParams<Path extends string> = Record<ParamNames<Path>, string>;

const uuid = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/i;

/** Whether the text can be the id of a row; PostgreSQL would answer anything else with an error of its own. */
export function isRowId(text: string): boolean {
  return uuid.test(text);
}

/** Materials have readable ids. */
export const isRowIdName = (name: string) => name.endsWith('Id') && name !== 'materialId';

/** Names of the parameters in the order of the path. */
export function pathParamNames(path: string): string[] {
  return [...path.matchAll(/:(\w+)/g)].map((match) => match[1]!);
}

/**
 * The parameters of the request.
 *
 * @throws Refusal 404 when one cannot be the id of anything
 */
export function readPathParams<Path extends string>(
  path: Path,
  given: Record<string, string | string[] | undefined>,
  noun: string,
): PathParams<Path> {
  const entries = pathParamNames(path).map((name): [string, string] => {
    const value = given[name];
    if (typeof value !== 'string' || value.includes('\0')) throw notFound(noun);
    if (isRowIdName(name) && !isRowId(value)) throw notFound(noun);
    return [name, value];
  });
  // Express matched the request with this very path, so these are its names.
  return Object.fromEntries(entries) as PathParams<Path>;
}
