import { z } from 'zod';
import { layoutSlug } from './layouts';
import { diagnosis } from '@/shared/diagnosis';
import { runs } from '@/shared/evidence';

/**
 * Body of POST /diagnoses: a board, and what its self-test reported in one run after the other. A document is read
 * by the service, so that all its problems come in one list.
 */
export const diagnosisRequest = z.strictObject({
  layout: z
    .union([
      layoutSlug.describe('The address of a published board.'),
      z.record(z.string(), z.unknown()).meta({ $ref: '#/components/schemas/LayoutDocumentInput' }),
    ])
    .describe('The address of a published board, or a whole layout document.'),
  runs,
});
export type DiagnosisRequest = z.output<typeof diagnosisRequest>;

/** Answer of POST /diagnoses: what the workspace shows. */
export const diagnosisAnswer = diagnosis;
