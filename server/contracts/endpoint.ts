import { type z } from 'zod';
import { type Permission } from './permissions.ts';

/** One request of the API. `reply: null` means 204; a `file` reply is bytes; `upload` takes one file as multipart field `file`. */
export interface Endpoint {
  readonly method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  readonly path: string;
  readonly summary: string;
  readonly permission: Permission | 'public';
  readonly params?: z.ZodObject;
  readonly query?: z.ZodType;
  readonly body?: z.ZodType;
  readonly upload?: { readonly maxBytes: number };
  readonly reply: z.ZodType | null;
  readonly status?: 201;
  readonly file?: string;
}
