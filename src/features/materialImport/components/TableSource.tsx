import { useRef, useState } from 'react';
import { LIMITS } from '../../../../shared/limits.ts';
import type { MaterialImport } from '../../../../shared/materialImport.ts';
import { Button } from '../../../components/Button.tsx';
import { Field, FormError } from '../../../components/Field.tsx';
import { FileDrop } from '../../../components/FileDrop.tsx';
import { Tabs } from '../../../components/Tabs.tsx';
import { controlLook } from '../../../components/controlLook.ts';
import { formatCount } from '../../../lib/format.ts';
import { useSendTable } from '../api/importTable.ts';
import { fileProblem, pasteProblem } from '../model/sourceProblem.ts';
import { ShareBar } from './ShareBar.tsx';

const limits = `CSV, TSV or plain text with numbers in columns; comma, semicolon, tab or spaces between them, decimal point or comma. At most ${formatCount(LIMITS.importBytes / 1e6)} MB and ${formatCount(LIMITS.importRows)} rows.`;

const ways = [
  { value: 'file' as const, label: 'Upload a file' },
  { value: 'paste' as const, label: 'Paste a table' },
];

type TableSourceProps = { groupId: string; onSent: (sent: MaterialImport) => void };

/** Where a table comes in: a file or a pasted text. What was pasted stays until it is taken. */
export function TableSource({ groupId, onSent }: TableSourceProps) {
  const [way, setWay] = useState<'file' | 'paste'>('file');
  const [text, setText] = useState('');
  const [refusal, setRefusal] = useState<string>();
  const { upload, paste, share } = useSendTable(groupId, onSent);
  const stop = useRef<AbortController>(null);
  const sendFile = (file: File) => {
    const problem = fileProblem(file);
    setRefusal(problem);
    if (problem !== undefined) return;
    stop.current = new AbortController();
    upload.mutate({ file, signal: stop.current.signal }, { onError: refuse });
  };
  const sendText = () => {
    const problem = pasteProblem(text);
    setRefusal(problem);
    if (problem === undefined) paste.mutate(text, { onError: refuse });
  };
  const refuse = (error: Error) => setRefusal(error.name === 'AbortError' ? undefined : error.message);
  return (
    <Tabs
      label="Where the table comes from"
      value={way}
      onValueChange={(chosen) => {
        setWay(chosen);
        setRefusal(undefined);
      }}
      tabs={ways}
    >
      <div className="flex max-w-[760px] flex-col gap-3 pt-3">
        {way === 'file' ? (
          <FileDrop
            label="Choose a file"
            hint={limits}
            accept=".csv,.tsv,.txt,.dat,text/*"
            disabled={upload.isPending}
            onFile={sendFile}
          />
        ) : (
          <Field
            label="Table"
            hint={`${limits} A pasted text may have ${formatCount(LIMITS.bodyBytes / 1e6)} MB.`}
          >
            {(control) => (
              <textarea
                {...control}
                value={text}
                onChange={(event) => setText(event.target.value)}
                rows={9}
                spellCheck={false}
                placeholder={'energy (eV); eps1; eps2\n1,50; -17,2; 26,4'}
                className={`${controlLook} font-mono`}
              />
            )}
          </Field>
        )}
        {share === null ? null : (
          <div className="flex items-end gap-3">
            <div className="flex-1">
              <ShareBar label="Sending the file" share={share} />
            </div>
            <Button onClick={() => stop.current?.abort()}>Stop</Button>
          </div>
        )}
        <FormError message={refusal} />
        {way === 'paste' ? (
          <div>
            <Button tone="primary" busy={paste.isPending} onClick={sendText}>
              Read this table
            </Button>
          </div>
        ) : null}
      </div>
    </Tabs>
  );
}
