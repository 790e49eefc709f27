import type { MaterialImport } from '../../../../shared/materialImport.ts';
import { Button } from '../../../components/Button.tsx';
import { formatCount } from '../../../lib/format.ts';
import { ShareBar } from './ShareBar.tsx';
import { TableFacts } from './TableFacts.tsx';
import { TableSource } from './TableSource.tsx';
import { WarningList } from './WarningList.tsx';

type TableStepProps = {
  groupId: string;
  /** Null before a table was sent. */
  sent: MaterialImport | null;
  onSent: (sent: MaterialImport) => void;
  onAnother: () => void;
};

/** The table as it came: being read, refused with the remedy, or read. */
export function TableStep({ groupId, sent, onSent, onAnother }: TableStepProps) {
  const asks = sent === null || sent.state === 'refused';
  return (
    <div className="flex flex-col gap-3">
      {sent?.state === 'refused' ? (
        <div role="alert" className="max-w-[760px] rounded-control bg-danger-soft px-3 py-2 text-danger">
          <p className="font-semibold">{sent.fileName} cannot be read</p>
          <p>{sent.error}</p>
        </div>
      ) : null}
      {/* Stays while a table is read: what was pasted must be there again when it is refused. */}
      <div hidden={!asks}>
        <TableSource groupId={groupId} onSent={onSent} />
      </div>
      {sent && !asks ? (
        <div className="flex flex-wrap items-start justify-between gap-3">
          <p>
            <span className="font-semibold wrap-anywhere">{sent.fileName}</span>{' '}
            <span className="text-muted">{formatCount(Math.max(1, Math.round(sent.bytes / 1000)))} kB</span>
          </p>
          <Button onClick={onAnother}>Take another table</Button>
        </div>
      ) : null}
      {sent?.state === 'reading' ? (
        <div className="max-w-[760px]">
          <ShareBar label="Reading the table" share={sent.progress} />
        </div>
      ) : null}
      {sent?.table ? (
        <>
          <TableFacts table={sent.table} />
          <WarningList label="Noticed while reading" warnings={sent.table.warnings} />
        </>
      ) : null}
    </div>
  );
}
