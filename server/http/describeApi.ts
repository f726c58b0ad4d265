import swagger from '@fastify/swagger';
import { createJsonSchemaTransform, createJsonSchemaTransformObject } from 'fastify-type-provider-zod';
import type { Api } from './httpServices';
import { named } from './schemas';

const transform = createJsonSchemaTransform({ schemaRegistry: named });
const transformObject = createJsonSchemaTransformObject({ schemaRegistry: named });

/** Makes the API's description (OpenAPI 3.1) from the routes and their schemas. Registered before the routes. */
export async function describeApi(app: Api, version: string): Promise<void> {
  await app.register(swagger, {
    openapi: {
      openapi: '3.1.0',
      info: {
        title: 'Leeboard',
        version,
        description: 'Turns each tropical-cyclone forecast into clock times, counts and lists. A planning aid: official forecasts, warnings and local authorities come first. Live messages are socket.io, namespace /live.',
      },
      components: {
        securitySchemes: {
          key: { type: 'http', scheme: 'bearer', description: 'A key, for programs' },
          session: { type: 'apiKey', in: 'cookie', name: 'leeboard.session_token', description: 'A session, for browsers' },
        },
      },
    },
    transform: (document) => {
      const { schema, url } = transform(document);
      const { access, accepts } = document.route.config ?? {};
      const security: Record<string, string[]>[] = access === 'anyone' ? [] : [{ key: [] }, { session: [] }];
      const described = { ...schema, security, description: access === 'anyone' ? 'Needs no key.' : `Needs the role ${access}.` };
      return { schema: accepts ? { ...described, body: { content: Object.fromEntries(accepts.map((type) => [type, { schema: bodySchema(type, url) }])) } } : described, url };
    },
    transformObject: (document) => withoutUnused(transformObject(document)),
  });
}

const REFERENCE = /"#\/components\/schemas\/([^"]+)"/g;

/** Each named part is described twice, as taken and as given; only those that a call leads to are kept. */
function withoutUnused<T extends { paths?: unknown; components?: { schemas?: Record<string, unknown> | undefined } }>(document: T): T {
  const schemas = document.components?.schemas ?? {};
  const reached = new Set<string>();
  const follow = (part: unknown): void => {
    for (const [, name] of JSON.stringify(part).matchAll(REFERENCE)) {
      if (reached.has(name)) continue;
      reached.add(name);
      follow(schemas[name]);
    }
  };
  follow(document.paths);
  return { ...document, components: { ...document.components, schemas: Object.fromEntries(Object.entries(schemas).filter(([name]) => reached.has(name))) } };
}

/** A body that is kept raw is described, not parsed, by its schema. */
function bodySchema(type: string, url: string): object {
  if (type === 'application/json' && url.endsWith('/advisories')) return { $ref: '#/components/schemas/Advisory' };
  if (type.startsWith('text/')) return { type: 'string' };
  return type.includes('json') ? { type: 'object' } : {};
}
