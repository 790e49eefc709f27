import { formatCount } from '../../../lib/format.ts';
import type { ImportedForm } from '../model/form.ts';

/** Constants that stay as they came from a file; what they are is changed by another import. */
export function ImportedNote({ form }: { form: ImportedForm }) {
  return (
    <p>
      {formatCount(form.rows)} rows of the imported file <b className="wrap-anywhere">{form.fileName}</b>,
      read with the same columns and sign habits as before. To type the values instead, choose another way
      above.
    </p>
  );
}
