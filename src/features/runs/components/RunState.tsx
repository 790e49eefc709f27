import type { Run } from '../../../../shared/run.ts';
import { UnfinishedWork } from '../../../components/UnfinishedWork.tsx';
import { useCancelRun } from '../api/changeRun.ts';

type Props = { run: Run; mayEdit: boolean; onRerun: () => void; rerunning: boolean };

const words = { counted: 'points', work: 'run', answer: 'values' };

/** Where a run stands that has no values to show. */
export function RunState({ run, ...rest }: Props) {
  const cancel = useCancelRun(run);
  return (
    <UnfinishedWork
      progress={run.progress}
      words={words}
      kept={false}
      cancel={cancel}
      onCancel={() => cancel.mutate()}
      {...rest}
    />
  );
}
