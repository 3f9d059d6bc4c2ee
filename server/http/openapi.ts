// One OpenAPI 3.1 document made from the same endpoints that the routes are mounted from.
import { z } from 'zod';
import { createDocument, type ZodOpenApiOperationObject, type ZodOpenApiPathsObject } from 'zod-openapi';
import { problemSchema } from '../../shared/kernel/problem';
import type { Endpoint } from '../../shared/kernel/endpoint';

const STATUSES: Record<string, string> = {
  '401': 'Signed out',
  '403': 'Never allowed for this role',
  '404': 'Missing or not yours',
  '409': 'Wrong state, or lost the race',
  '422': 'Bad input',
  '429': 'Too many tries; see Retry-After',
};

function operationOf(endpoint: Endpoint): ZodOpenApiOperationObject {
  const status = String(endpoint.status ?? (endpoint.answer ? 200 : 204)) as `${2}${string}`;
  const problem = { 'application/problem+json': { schema: problemSchema } };
  const failures = Object.fromEntries(
    Object.entries(STATUSES).map(([code, description]) => [code, { description, content: problem }]),
  );
  const media = endpoint.file ? 'multipart/form-data' : 'application/json';
  const fileBody = (body: z.ZodType | undefined, field: string): z.ZodType => {
    const file = z.object({ [field]: z.string().meta({ format: 'binary' }) });
    return body instanceof z.ZodObject ? body.extend(file.shape) : file;
  };
  const body = endpoint.file ? fileBody(endpoint.body, endpoint.file) : endpoint.body;
  return {
    summary: endpoint.summary,
    'x-access': endpoint.access,
    ...(endpoint.params || endpoint.query
      ? {
          requestParams: {
            ...(endpoint.params instanceof z.ZodObject ? { path: endpoint.params } : {}),
            ...(endpoint.query instanceof z.ZodObject ? { query: endpoint.query } : {}),
          },
        }
      : {}),
    ...(body ? { requestBody: { required: true, content: { [media]: { schema: body } } } } : {}),
    responses: {
      [status]: endpoint.answer
        ? { description: 'Done', content: { 'application/json': { schema: endpoint.answer } } }
        : { description: 'Done' },
      ...failures,
    },
  };
}

export function openApiDocument(endpoints: readonly Endpoint[]): unknown {
  const paths: ZodOpenApiPathsObject = {};
  for (const endpoint of endpoints) {
    const path = endpoint.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: operationOf(endpoint) };
  }
  return createDocument({
    openapi: '3.1.0',
    info: {
      title: 'Spragyard',
      version: '1',
      description:
        'JSON in camelCase; money in integer cents; times in ISO 8601 UTC; errors per RFC 9457. Unsafe methods need the ' +
        'header x-csrf-token with the token of GET /api/auth/me.',
    },
    paths,
  });
}
