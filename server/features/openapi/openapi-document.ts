import { z } from 'zod';
import { type RouteContract, routes, type SchemaName, schemas } from '#shared/api/routes.ts';

type Json = Readonly<Record<string, unknown>>;

const reference = (name: SchemaName) => ({
  $ref: `#/components/schemas/${name}`,
});
const json = (name: SchemaName) => ({
  'application/json': { schema: reference(name) },
});

/** The API in OpenAPI 3.1, made from the contracts that the server itself obeys. */
export function openapiDocument(): Json {
  const paths: Record<string, Record<string, Json>> = {};
  for (const route of routes)
    paths[route.path] = {
      ...paths[route.path],
      [route.method]: operation(route),
    };
  return {
    openapi: '3.1.0',
    info: {
      title: 'Swashbench',
      version: '1',
      description: 'All quantities in SI base units; pressures gauge, temperatures in kelvin. A calculation, not a permission.',
    },
    paths,
    components: { schemas: componentSchemas() },
  };
}

function operation(route: RouteContract): Json {
  const responses: Record<string, Json> = {
    default: { description: 'Refused', content: json('ErrorBody') },
  };
  for (const [status, { words, schema }] of Object.entries(route.answers)) {
    responses[status] = {
      description: words,
      ...(schema ? { content: json(schema) } : {}),
    };
  }
  return {
    summary: route.summary,
    ...(route.request ? { requestBody: { required: true, content: json(route.request) } } : {}),
    responses,
  };
}

/** A registry of our own: the global one would silently accept the same name twice. */
function componentSchemas(): Record<string, Json> {
  const registry = z.registry<{ id: string }>();
  for (const [id, schema] of Object.entries(schemas)) registry.add(schema, { id });
  const made = z.toJSONSchema(registry, {
    uri: (id) => `#/components/schemas/${id}`,
    io: 'input',
  });
  return Object.fromEntries(
    Object.entries(made.schemas).map(([id, schema]) => {
      const { $id, $schema, ...rest } = schema as Json;
      return [id, rest];
    }),
  );
}
