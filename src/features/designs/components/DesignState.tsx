import type { Design } from '../../../../shared/design.ts';
import { UnfinishedWork } from '../../../components/UnfinishedWork.tsx';
import { useCancelDesign } from '../api/changeDesign.ts';

type Props = {
  design: Design;
  mayEdit: boolean;
  /** Whether what it had found before its end is there; undefined until that is known. */
  kept: boolean | undefined;
  onRerun: () => void;
  rerunning: boolean;
};

const words = { counted: 'films', work: 'calculation', answer: 'answer' };

/** Where a design stands that has no answer yet. */
export function DesignState({ design, ...rest }: Props) {
  const cancel = useCancelDesign(design.groupId);
  return (
    <UnfinishedWork
      progress={design.progress}
      words={words}
      cancel={cancel}
      onCancel={() => cancel.mutate(design.id)}
      {...rest}
    />
  );
}
