import { z } from 'zod';
import { layoutSlug } from './layouts';
import { diagnosis } from '@/shared/diagnosis';
import { runs } from '@/shared/evidence';
import { layoutDocument } from '@/shared/layout/document';

/** Body of POST /diagnoses: a board, and what its self-test reported in one run after the other. */
export const diagnosisRequest = z.strictObject({
  layout: z.union([layoutSlug, layoutDocument]).describe('The address of a published board, or a whole document.'),
  runs,
});
export type DiagnosisRequest = z.input<typeof diagnosisRequest>;

/** Answer of POST /diagnoses: what the workspace shows. */
export const diagnosisAnswer = diagnosis;
