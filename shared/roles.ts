import { z } from 'zod';
import { roles } from './standing';

// The words and their order stand apart, so that a page can ask them without loading the schemas.
export * from './standing';

export const roleSchema = z.enum(roles);
