import { z } from 'zod';
import type { Contract } from '#shared/contract.ts';
import { problemSchema } from '#shared/problem.ts';
import type { Access, AccessTable, Route } from './http.ts';

/** The API document (OpenAPI 3.1) from the same contracts and access table that the routes are made of. */
export function openApiDocument(routes: readonly Route[], table: AccessTable): object {
  const paths: Record<string, Record<string, object>> = {};
  for (const { contract } of routes) {
    const path = contract.path.replace(/:(\w+)/g, '{$1}');
    paths[path] ??= {};
    paths[path][contract.method.toLowerCase()] = operation(contract, table[`${contract.method} ${contract.path}`]);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Panelgap', version: '1', description: 'The rebuilds of a shop, and what they say.' },
    paths,
    components: {
      schemas: { Problem: schema(problemSchema, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: 'panelgap' } },
    },
  };
}

function operation(contract: Contract, access: Access | undefined): object {
  const roles = typeof access === 'string' ? [access] : [...(access ?? [])];
  const parameters = [
    ...fields(contract.params, 'path'),
    ...fields(contract.query, 'query'),
    ...(contract.once ? [header('Idempotency-Key')] : []),
    ...(contract.edits ? [header('If-Match', contract.edits === true)] : []),
  ];
  return {
    summary: contract.summary,
    'x-roles': roles,
    ...(access === 'everyone' ? {} : { security: [{ session: [] }] }),
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(contract.body && !contract.upload
      ? { requestBody: body('application/json', schema(contract.body, 'input')) }
      : {}),
    ...(contract.upload ? { requestBody: body('multipart/form-data', { type: 'object' }) } : {}),
    responses: { ...success(contract), default: problem() },
  };
}

function success(contract: Contract): object {
  if (contract.response instanceof z.ZodVoid) return { 204: { description: 'Done' } };
  const status = contract.once ? 201 : 200;
  const type = contract.stream ? 'text/event-stream' : 'application/json';
  return {
    [status]: { description: 'Done', content: { [type]: { schema: schema(contract.response, 'output') } } },
  };
}

const problem = () => ({
  description: 'What went wrong (RFC 9457)',
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
});

const body = (type: string, content: object) => ({ required: true, content: { [type]: { schema: content } } });

const header = (name: string, required = true) => ({ name, in: 'header', required, schema: { type: 'string' } });

function fields(shape: z.ZodType | undefined, where: 'path' | 'query'): object[] {
  if (!shape) return [];
  const { properties = {}, required = [] } = schema(shape, 'input') as {
    properties?: Record<string, object>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, content]) => ({
    name,
    in: where,
    required: where === 'path' || required.includes(name),
    schema: content,
  }));
}

function schema(type: z.ZodType, io: 'input' | 'output'): object {
  const { $schema: _, ...rest } = z.toJSONSchema(type, { io, unrepresentable: 'any' });
  return rest;
}
