import { type Request, type Response } from 'express';
import { type z } from 'zod';
import { type Person } from '#server/account/person.ts';
import { type EndpointName, type endpoints } from '#server/contracts/endpoints.ts';
import { type Upload } from './upload.ts';

type Definition<Name extends EndpointName> = (typeof endpoints)[Name];
type Parsed<Name extends EndpointName, Part extends 'params' | 'query' | 'body'> =
  Definition<Name> extends Record<Part, infer Schema extends z.ZodType> ? z.output<Schema> : undefined;

/** A request that has passed: who makes it, and what it asks, parsed by the endpoint's schemas. */
export interface Call<Name extends EndpointName> {
  readonly person: Definition<Name>['permission'] extends 'public' ? null : Person;
  readonly params: Parsed<Name, 'params'>;
  readonly query: Parsed<Name, 'query'>;
  readonly body: Parsed<Name, 'body'>;
  /** The file that came in, where the endpoint takes one. */
  readonly upload: Definition<Name> extends { upload: object } ? Upload : undefined;
  readonly now: Date;
  readonly request: Request;
  readonly response: Response;
}

/** A file to be sent; text goes out as UTF-8. */
export type ServedFile = { readonly fileName: string; readonly mediaType: string } & (
  { readonly text: string } | { readonly bytes: Uint8Array }
);

/** `record` is called with the sum of the file's bytes before they go out, and not when none do. */
export interface FileReply {
  readonly file: ServedFile;
  /** Shown where it is asked for, as a photograph is, instead of being saved. */
  readonly inline?: boolean;
  record?(checksum: string): Promise<void>;
}

type ReplyOf<Name extends EndpointName> =
  Definition<Name> extends { file: string }
    ? FileReply
    : Definition<Name>['reply'] extends infer Schema extends z.ZodType
      ? z.output<Schema>
      : undefined | void;

type Handler<Name extends EndpointName> = (call: Call<Name>) => Promise<ReplyOf<Name>>;
/** One handler for every endpoint of the table. */
export type Handlers = { readonly [Name in EndpointName]: Handler<Name> };
