import { z } from 'zod';
import { problemDocument } from '@/shared/api/problem';
import { diagnosis } from '@/shared/diagnosis';
import { change, evidence, run } from '@/shared/evidence';
import { layoutDocument } from '@/shared/layout/document';
import { layoutProblem } from '@/shared/layout/problem';

/** A JSON Schema, or a part of one. */
export type JsonSchema = Record<string, unknown>;

/** Where a schema of the documentation stands. */
const place = '#/components/schemas/';

/** Schemas that stand once in the documentation under a name; every other one is written where it is used. */
const named = z.registry<{ id: string }>();
named.add(layoutDocument, { id: 'LayoutDocument' });
named.add(layoutProblem, { id: 'LayoutProblem' });
named.add(diagnosis, { id: 'Diagnosis' });
named.add(evidence, { id: 'Evidence' });
named.add(change, { id: 'Change' });
named.add(run, { id: 'Run' });
named.add(problemDocument, { id: 'Problem' });

/** Collects the named schemas of a document while its routes are written. */
export interface SchemaCollector {
  /** The schema of something that is sent (`input`) or answered (`output`). */
  readonly write: (schema: z.ZodType, io: 'input' | 'output') => JsonSchema;
  /** The named schemas that were met so far, and those that a hand-written reference leads to. */
  readonly components: () => Record<string, JsonSchema>;
}

/**
 * Turns zod schemas into JSON Schema for OpenAPI 3.1. A named schema whose defaults make a difference stands twice:
 * as it is answered, and with "Input" behind its name as it is sent.
 */
export const collectSchemas = (): SchemaCollector => {
  const components: Record<string, JsonSchema> = {};
  const write: SchemaCollector['write'] = (schema, io) => {
    const nameOf = (id: string) => (io === 'input' ? `${id}Input` : id);
    const {
      $schema: _,
      $defs,
      ...body
    } = z.toJSONSchema(schema, {
      io,
      metadata: named,
      unrepresentable: 'any',
      override: ({ zodSchema, jsonSchema }) => {
        dropNoise(jsonSchema);
        const meta = z.globalRegistry.get(zodSchema);
        if (meta?.description) jsonSchema.description ??= meta.description;
        if (typeof meta?.$ref !== 'string') return;
        for (const key of Object.keys(jsonSchema)) delete jsonSchema[key];
        jsonSchema.$ref = meta.$ref;
      },
    }) as JsonSchema & { $defs?: Record<string, JsonSchema> };
    const renamed = (part: JsonSchema) => renameReferences(part, nameOf);
    for (const [id, definition] of Object.entries($defs ?? {})) components[nameOf(id)] = renamed(withoutId(definition));
    return renamed(withoutId(body));
  };
  return {
    write,
    components: () => {
      // Bodies that a service reads by itself refer to it by name only.
      if (!components.LayoutDocumentInput) write(layoutDocument, 'input');
      return Object.fromEntries(Object.entries(components).sort(([a], [b]) => (a < b ? -1 : 1)));
    },
  };
};

/** Takes out what says nothing beyond a well-known format or the range of exact numbers. */
const dropNoise = (schema: JsonSchema): void => {
  if (schema.format !== undefined) delete schema.pattern;
  if (schema.minimum === Number.MIN_SAFE_INTEGER) delete schema.minimum;
  if (schema.maximum === Number.MAX_SAFE_INTEGER) delete schema.maximum;
};

const withoutId = ({ id: _, ...rest }: JsonSchema): JsonSchema => rest;

const local = '#/$defs/';

const renameReferences = (part: JsonSchema, nameOf: (id: string) => string): JsonSchema =>
  JSON.parse(JSON.stringify(part), (key, value: unknown) =>
    key === '$ref' && typeof value === 'string' && value.startsWith(local)
      ? place + nameOf(value.slice(local.length))
      : value,
  ) as JsonSchema;
