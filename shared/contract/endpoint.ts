import type { z } from 'zod'

type Schema = z.ZodType
/** What crosses the wire at one URL. Routes, the API client and the OpenAPI document are all made from it. */
export interface Endpoint<
  Params extends Schema | undefined = Schema | undefined,
  Query extends Schema | undefined = Schema | undefined,
  Body extends Schema | undefined = Schema | undefined,
  Response extends Schema | undefined = Schema | undefined,
> {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE'
  /** Express style, for example `/api/athletes/:athleteId/today`. */
  path: `/api/${string}`
  summary: string
  /** Who may call it at all; finer rules live in the feature's policy. */
  access: 'public' | 'signedIn'
  params?: Params
  query?: Query
  body?: Body
  /** Undefined means 204 with no body. */
  response?: Response
  /** Success status; 200 with a response and 204 without unless said. */
  status?: 200 | 201 | 202 | 204
}

/** Declares an endpoint and keeps its exact schema types. */
export function endpoint<
  Params extends Schema | undefined = undefined,
  Query extends Schema | undefined = undefined,
  Body extends Schema | undefined = undefined,
  Response extends Schema | undefined = undefined,
>(definition: Endpoint<Params, Query, Body, Response>): Endpoint<Params, Query, Body, Response> {
  return definition
}

type Parsed<T> = T extends Schema ? z.output<T> : undefined
type Sent<T> = T extends Schema ? z.input<T> : undefined
/** What the route handler receives, after parsing. */
export type Received<E> =
  E extends Endpoint<infer P, infer Q, infer B, Schema | undefined>
    ? { params: Parsed<P>; query: Parsed<Q>; body: Parsed<B> }
    : never
/** What the client passes, before parsing. */
export type Sending<E> =
  E extends Endpoint<infer P, infer Q, infer B, Schema | undefined>
    ? { params: Sent<P>; query: Sent<Q>; body: Sent<B> }
    : never
export type ResponseOf<E> =
  E extends Endpoint<Schema | undefined, Schema | undefined, Schema | undefined, infer R> ? Parsed<R> : never
