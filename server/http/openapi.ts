import { z } from 'zod';
import { type Endpoint } from '@/shared/contract/define-endpoint';
import { apiErrorSchema } from '@/shared/contract/error-codes';
import { apiRoot, requestHeader } from '@/shared/contract/request-headers';

const json = (schema: z.ZodType) => ({
  'application/json': { schema: z.toJSONSchema(schema, { unrepresentable: 'any', io: 'output' }) },
});
const input = (schema: z.ZodType) => z.toJSONSchema(schema, { unrepresentable: 'any', io: 'input' });

/** The contract as an OpenAPI 3.1 document, made from the same table the server mounts. */
export function openApiDocument(endpoints: Readonly<Record<string, Endpoint>>): object {
  const paths: Record<string, Record<string, object>> = {};
  for (const endpoint of Object.values(endpoints)) {
    const path = `${apiRoot}${endpoint.path.replace(/:(\w+)/g, '{$1}')}`;
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: operationOf(endpoint) };
  }
  return { openapi: '3.1.0', info: { title: 'Brierbook', version: '1' }, paths };
}

function operationOf(endpoint: Endpoint): object {
  const { access, body, response, status } = endpoint;
  const who = access.kind === 'desk' ? `${access.roles.join(', ')}; rows: ${access.rows}` : access.kind;
  return {
    operationId: endpoint.name,
    summary: endpoint.summary,
    description: `Who may call: ${who}.`,
    parameters: [
      ...parametersOf(endpoint.params, 'path'),
      ...parametersOf(endpoint.query, 'query'),
      ...(endpoint.method === 'GET'
        ? []
        : [{ name: requestHeader.name, in: 'header', required: true, schema: { const: requestHeader.value } }]),
      ...(endpoint.needsVersion
        ? [{ name: 'If-Match', in: 'header', required: true, schema: { type: 'integer' } }]
        : []),
    ],
    ...(body === null
      ? {}
      : body === 'file'
        ? {
            requestBody: {
              required: true,
              content: {
                'multipart/form-data': {
                  schema: { type: 'object', properties: { file: { type: 'string', format: 'binary' } } },
                },
              },
            },
          }
        : { requestBody: { required: true, content: { 'application/json': { schema: input(body) } } } }),
    responses: {
      [status]: { description: 'Done', ...contentOf(response) },
      default: { description: 'Refused', content: json(apiErrorSchema) },
    },
  };
}

function contentOf(response: Endpoint['response']): object {
  if (response === null) return {};
  const file = { '*/*': { schema: { type: 'string', format: 'binary' } } };
  return { content: response === 'stream' ? file : json(response) };
}

function parametersOf(schema: z.ZodType, place: 'path' | 'query'): object[] {
  const { properties = {}, required = [] } = input(schema);
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}
