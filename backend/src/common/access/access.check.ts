import { Injectable, type OnApplicationBootstrap, RequestMethod } from '@nestjs/common';
import { METHOD_METADATA, PATH_METADATA } from '@nestjs/common/constants.js';
import { DiscoveryService, MetadataScanner } from '@nestjs/core';
import { ACCESS, type Access } from './access.js';

export interface DeclaredRoute {
  readonly method: string;
  readonly path: string;
  readonly handler: string;
  readonly access: Access | null;
}

/** Knows every route there is; the server does not start while one declares no access. */
@Injectable()
export class AccessCheck implements OnApplicationBootstrap {
  constructor(
    private readonly discovery: DiscoveryService,
    private readonly scanner: MetadataScanner,
  ) {}

  onApplicationBootstrap(): void {
    const open = this.routes().filter((route) => route.access === null);
    if (open.length > 0) {
      throw new Error(`These routes declare no access: ${open.map((route) => route.handler).join(', ')}`);
    }
  }

  routes(): DeclaredRoute[] {
    return this.discovery.getControllers().flatMap(({ instance, metatype }) => {
      if (!instance || !metatype) return [];
      const prototype = Object.getPrototypeOf(instance) as object;
      const base = (Reflect.getMetadata(PATH_METADATA, metatype) as string | undefined) ?? '';
      return this.scanner
        .getAllMethodNames(prototype)
        .flatMap((name) => this.routeOf(prototype, name, base, metatype.name));
    });
  }

  private routeOf(prototype: object, name: string, base: string, controller: string): DeclaredRoute[] {
    const handler = (prototype as Record<string, unknown>)[name];
    if (typeof handler !== 'function') return [];
    const path = Reflect.getMetadata(PATH_METADATA, handler) as string | undefined;
    if (path === undefined) return [];
    const method = RequestMethod[Reflect.getMetadata(METHOD_METADATA, handler) as number] ?? 'ALL';
    const access = (Reflect.getMetadata(ACCESS, handler) as Access | undefined) ?? null;
    return [
      { method, path: `/${[base, path].join('/')}`.replaceAll(/\/+/g, '/'), handler: `${controller}.${name}`, access },
    ];
  }
}
