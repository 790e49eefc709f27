import { useState } from 'react';
import type { CreateRun, Run } from '../../../../shared/run.ts';
import { pointCountOf } from '../../../../shared/runAxes.ts';
import { Button } from '../../../components/Button.tsx';
import { ApiError } from '../../../lib/apiClient.ts';
import { formatCount } from '../../../lib/format.ts';
import { useCreateRun } from '../api/createRun.ts';

type Props = {
  body: CreateRun;
  /** Whether the film or the axis is such that the run would be refused. */
  problem: boolean;
  onKept: (run: Run) => void;
};

/** The primary button of the stack page: what is on the page becomes a stored run of all its points. */
export function KeepAsRun({ body, problem, onKept }: Props) {
  const create = useCreateRun();
  // One key a press; it changes only once the press has been answered.
  const [key, setKey] = useState(() => crypto.randomUUID());
  const points = formatCount(pointCountOf(body));
  const failure = create.error instanceof ApiError ? create.error : null;
  const press = () => {
    create.mutate(
      { body, key },
      {
        onSuccess: onKept,
        onError: () => setKey(crypto.randomUUID()),
      },
    );
  };
  return (
    <>
      <Button
        tone="primary"
        busy={create.isPending || create.isSuccess}
        disabled={problem}
        title={problem ? 'First mend what is marked' : `Compute and store ${points} points`}
        onClick={press}
      >
        {create.isPending ? 'Keeping' : 'Keep as run'}
      </Button>
      {create.error && (
        <p role="alert" className="w-full text-note text-danger">
          Not kept: {create.error.message}
          {failure?.issues.map(({ path, message }) => (
            <span key={path + message} className="block">
              {path}: {message}
            </span>
          ))}
        </p>
      )}
    </>
  );
}
