import { LIMITS } from '../../../../shared/limits.ts';
import type { Study } from '../../../../shared/study.ts';
import { formatDateTime } from '../../../lib/format.ts';
import { Markdown } from './Markdown.tsx';
import { MarkdownField } from './MarkdownField.tsx';

type Props = {
  decision: string;
  decided: Study['decided'];
  /** Absent for people who may not change it. */
  onChange?: (decision: string) => void;
};

/** What was decided, by whom and when. */
export function DecisionSection({ decision, decided, onChange }: Props) {
  return (
    <section aria-labelledby="decision-heading">
      <h2 id="decision-heading" className="text-lead">
        Decision
      </h2>
      <p className="mb-2 text-note text-muted">
        {decided ? `Decided by ${decided.by}, ${formatDateTime(decided.at)}.` : 'Nothing is decided yet.'}
        {onChange ? ' Whoever saves a change of these words is named here.' : ''}
      </p>
      {onChange ? (
        <MarkdownField
          label="What was decided, and why"
          value={decision}
          maxLength={LIMITS.studyNoteLength}
          onChange={onChange}
        />
      ) : (
        decision.trim() !== '' && (
          <div className="card px-4 py-3">
            <Markdown text={decision} />
          </div>
        )
      )}
    </section>
  );
}
