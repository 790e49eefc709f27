import type { Description } from '../model/describeModel.ts';

/** A law with its parameters, one a line. */
export function Law({ law, parameters }: Description) {
  return (
    <div className="flex flex-col gap-2">
      <p className="wrap-anywhere">{law}</p>
      {parameters.length > 0 ? (
        <dl className="grid grid-cols-[auto_1fr] gap-x-4 gap-y-0.5 text-note">
          {parameters.map(({ name, value }) => (
            <div key={name} className="contents">
              <dt className="text-muted">{name}</dt>
              <dd className="min-w-0 select-all">{value}</dd>
            </div>
          ))}
        </dl>
      ) : null}
    </div>
  );
}
