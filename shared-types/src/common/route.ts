import type { z } from 'zod';

export type HttpMethod = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/**
 * One route, once: the server validates and strips by it, OpenAPI is generated from it and the page's client is typed by it.
 * `path` is the whole path with `:name` parameters.
 */
export interface RouteContract<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Answer extends z.ZodType = z.ZodType,
> {
  readonly method: HttpMethod;
  readonly path: string;
  readonly summary: string;
  readonly status: number;
  readonly params?: Params;
  readonly query?: Query;
  readonly body?: Body;
  readonly answer: Answer;
}

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined;
type Given<S> = S extends z.ZodType ? z.input<S> : undefined;
type PartOf<R, K extends string> = R extends { readonly [k in K]: infer S } ? S : undefined;

/** What a controller receives: every part parsed. */
export interface RouteInput<R> {
  params: Parsed<PartOf<R, 'params'>>;
  query: Parsed<PartOf<R, 'query'>>;
  body: Parsed<PartOf<R, 'body'>>;
}

type Required<K extends string, S> = S extends z.ZodType ? { [k in K]: z.input<S> } : { [k in K]?: undefined };

/** What a caller gives. */
export type RouteCall<R> = Required<'params', PartOf<R, 'params'>> &
  (Given<PartOf<R, 'query'>> extends undefined ? { query?: undefined } : { query?: Given<PartOf<R, 'query'>> }) &
  Required<'body', PartOf<R, 'body'>>;

export type RouteAnswer<R> = R extends { readonly answer: infer A extends z.ZodType } ? z.output<A> : never;
export type RouteAnswerGiven<R> = R extends { readonly answer: infer A extends z.ZodType } ? z.input<A> : never;

/** Declares a route; keeps the literal types of its parts. */
export function route<const R extends RouteContract>(contract: R): R {
  return contract;
}
