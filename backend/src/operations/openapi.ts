import { Injectable } from '@nestjs/common';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import type { RouteContract } from '@holdwater/shared-types/common/route.js';
import { errorBody } from '@holdwater/shared-types/errors/error-body.js';
import { z } from 'zod';
import { ACCESS, type Access } from '../common/access/access.js';
import { CONTRACT } from '../common/contract/contract-route.js';

export interface ServedRoute {
  contract: RouteContract;
  access: Access;
}

type Json = Record<string, unknown>;

/** Every contract the server serves, as one OpenAPI 3.1 document. Made from what validates the requests, so that it cannot differ. */
@Injectable()
export class OpenApi {
  private document: Json | null = null;

  constructor(
    private readonly discovery: DiscoveryService,
    private readonly scanner: MetadataScanner,
  ) {}

  routes(): ServedRoute[] {
    const served = this.discovery.getControllers().flatMap(({ instance }) => {
      if (!instance) return [];
      const prototype = Object.getPrototypeOf(instance) as Record<string, object>;
      return this.scanner.getAllMethodNames(prototype).flatMap((name) => servedBy(prototype[name]));
    });
    return served.sort(
      (a, b) => a.contract.path.localeCompare(b.contract.path) || a.contract.method.localeCompare(b.contract.method),
    );
  }

  /** The document; made once. */
  build(): Json {
    this.document ??= {
      openapi: '3.1.0',
      info: {
        title: 'Holdwater',
        version: '1',
        description:
          'The shared calendar and lot file of builder, plumber and building department. Writes may carry an Idempotency-Key.',
      },
      paths: this.paths(),
      components: {
        securitySchemes: { bearer: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
        schemas: { Error: schemaOf(errorBody, 'output') },
      },
    };
    return this.document;
  }

  private paths(): Json {
    const paths: Record<string, Json> = {};
    for (const route of this.routes()) {
      const path = route.contract.path.replaceAll(/:(\w+)/g, '{$1}');
      paths[path] = { ...paths[path], [route.contract.method.toLowerCase()]: operationOf(route) };
    }
    return paths;
  }
}

function servedBy(handler: object | undefined): ServedRoute[] {
  if (typeof handler !== 'function') return [];
  const contract = Reflect.getMetadata(CONTRACT, handler) as RouteContract | undefined;
  const access = Reflect.getMetadata(ACCESS, handler) as Access | undefined;
  return contract && access ? [{ contract, access }] : [];
}

function operationOf({ contract, access }: ServedRoute): Json {
  const tag = contract.path.split('/')[contract.path.startsWith('/api/public/') ? 3 : 2];
  return {
    operationId: `${contract.method.toLowerCase()}${contract.path.replaceAll(/[^A-Za-z]+(\w?)/g, (_whole, letter: string) => letter.toUpperCase())}`,
    summary: contract.summary,
    tags: [tag],
    ...(access.kind !== 'anyone' && { security: [{ bearer: [] }] }),
    parameters: [...parametersOf(contract.params, 'path'), ...parametersOf(contract.query, 'query')],
    ...(contract.body && { requestBody: { required: true, content: json(schemaOf(contract.body, 'input')) } }),
    responses: {
      [contract.status]: { description: 'Done', content: json(schemaOf(contract.answer, 'output')) },
      default: { description: 'Refused', content: json({ $ref: '#/components/schemas/Error' }) },
    },
  };
}

function parametersOf(schema: z.ZodType | undefined, place: 'path' | 'query'): Json[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema, 'input') as {
    properties?: Record<string, Json>;
    required?: string[];
  };
  return Object.entries(properties).map(([name, each]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: each,
  }));
}

function json(schema: Json): Json {
  return { 'application/json': { schema } };
}

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  });
  return rest;
}
