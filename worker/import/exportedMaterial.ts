import { z } from 'zod';
import { LIMITS } from '../../shared/limits.ts';
import { materialClasses, materialContentSchema } from '../../shared/material.ts';

/** First line of a file that Skewlight exported. */
export const EXPORT_MARK = '# Skewlight material';
/** Start of the line that holds everything but the tabulated numbers, as JSON. */
export const DEFINITION_MARK = '# definition: ';
export const EXPORT_COLUMNS = ['wavelength_nm', 'n', 'k', 'Q_re', 'Q_im'] as const;

/** In the definition, in place of a table whose numbers stand in the columns. */
export const inColumns = { kind: 'columns' } as const;

export const exportedMaterialSchema = z.strictObject({
  name: z.string().min(1).max(LIMITS.nameLength),
  formula: z.string().min(1),
  class: z.enum(materialClasses),
  notes: z.array(z.string()),
  content: materialContentSchema,
});

/** A material as it travels in an exported file. */
export type ExportedMaterial = z.infer<typeof exportedMaterialSchema>;
