import { Download } from 'lucide-react';
import { apiBase } from '../../lib/apiClient.ts';

type Props = {
  /** Of the link, or of a design in the study that it opens. */
  path: string;
};

/** The answer and the input of a shared design as files. */
export function DesignFiles({ path }: Props) {
  const files = [
    { name: 'result.csv', label: 'Result (CSV)' },
    { name: 'input.json', label: 'Input (input.json)' },
  ];
  return (
    <p className="flex flex-wrap gap-x-4 gap-y-1">
      {files.map(({ name, label }) => (
        <a
          key={name}
          className="prose-link inline-flex items-center gap-1.5"
          href={`${apiBase}${path}/${name}`}
          download
        >
          <Download size={14} aria-hidden />
          {label}
        </a>
      ))}
    </p>
  );
}
