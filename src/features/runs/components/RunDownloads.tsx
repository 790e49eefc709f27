import { Check, Copy, Download } from 'lucide-react';
import { useState } from 'react';
import { IconButton } from '../../../components/Button.tsx';

/** Where the file of the input is kept when it is downloaded. */
const INPUT_FILE = 'input.json';
const COMMAND = `npm run -s solve -- ${INPUT_FILE} > results.json`;

type Props = {
  /** `/runs/…`, `/designs/…` or `/shared/…`. */
  path: string;
  /** What the values are called there. */
  valuesFile?: 'data.csv' | 'result.csv';
  /** Whether there are values to download. */
  hasData: boolean;
};

/** Values and input of a run as files, and the command that repeats it. */
export function RunDownloads({ path, valuesFile = 'data.csv', hasData }: Props) {
  const [copied, setCopied] = useState(false);
  return (
    <section aria-label="Downloads">
      <h2 className="mb-2 text-lead">Take it away</h2>
      <div className="flex flex-wrap gap-x-4 gap-y-1">
        {hasData && <FileLink href={`/api/v1${path}/${valuesFile}`}>Values (CSV)</FileLink>}
        <FileLink href={`/api/v1${path}/input.json`}>Input ({INPUT_FILE})</FileLink>
      </div>
      <p className="mt-2 text-note text-muted">
        The input repeats this calculation on the command line, without a server or a database:
      </p>
      <div className="mt-1 flex items-center gap-1 rounded-control border border-line bg-panel py-0.5 pr-0.5 pl-3">
        <code className="min-w-0 flex-1 overflow-x-auto text-note whitespace-nowrap select-all" tabIndex={0}>
          {COMMAND}
        </code>
        <IconButton
          label="Copy the command"
          onClick={() => {
            void navigator.clipboard.writeText(COMMAND).then(() => setCopied(true));
          }}
        >
          {copied ? <Check size={15} aria-hidden /> : <Copy size={15} aria-hidden />}
        </IconButton>
      </div>
      <span role="status" className="sr-only">
        {copied ? 'Copied' : ''}
      </span>
    </section>
  );
}

function FileLink({ href, children }: { href: string; children: React.ReactNode }) {
  return (
    <a className="prose-link inline-flex items-center gap-1.5" href={href} download>
      <Download size={14} aria-hidden />
      {children}
    </a>
  );
}
