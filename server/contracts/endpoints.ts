import { z } from 'zod';
import { datOptionsSchema, dxfOptionsSchema, svgOptionsSchema } from '#geometry/formats/options.ts';
import { idSchema, pageQuerySchema } from './common.ts';
import { type Endpoint } from './endpoint.ts';
import { healthSchema, meSchema, passwordChangeSchema, preferencesSchema } from './people.ts';
import {
  downloadPageSchema,
  draftInputSchema,
  draftSchema,
  releaseSchema,
  sectionChangeSchema,
  sectionCreateSchema,
  sectionListQuerySchema,
  sectionPageSchema,
  sectionSchema,
  versionCreateSchema,
  versionPageSchema,
  versionSchema,
  withdrawSchema,
} from './sections.ts';
import { shopEndpoints } from './shop-endpoints.ts';

const sectionParams = z.object({ sectionId: idSchema });
const versionParams = z.object({
  sectionId: idSchema,
  number: z.coerce.number().int().min(1).max(1_000_000),
});
const section = '/api/sections/:sectionId';
const version = '/api/sections/:sectionId/versions/:number';

/**
 * Every request of the API as data: the server registers its routes from it, the client calls by it, the OpenAPI
 * document and the permission matrix of the tests are made from it.
 */
export const endpoints = {
  health: {
    method: 'GET',
    path: '/api/health',
    summary: 'Is the service up',
    permission: 'public',
    reply: healthSchema,
  },
  me: {
    method: 'GET',
    path: '/api/me',
    summary: 'Who is signed in',
    permission: 'account.own',
    reply: meSchema,
  },
  changePreferences: {
    method: 'PATCH',
    path: '/api/me/preferences',
    summary: 'Set units and theme',
    permission: 'account.own',
    body: preferencesSchema.partial(),
    reply: meSchema,
  },
  changePassword: {
    method: 'POST',
    path: '/api/me/password',
    summary: 'Set a new password; ends all sessions',
    permission: 'account.own',
    body: passwordChangeSchema,
    reply: null,
  },

  listSections: {
    method: 'GET',
    path: '/api/sections',
    summary: 'The library',
    permission: 'released.read',
    query: sectionListQuerySchema,
    reply: sectionPageSchema,
  },
  createSection: {
    method: 'POST',
    path: '/api/sections',
    summary: 'New section with version 1',
    permission: 'sections.write',
    body: sectionCreateSchema,
    reply: sectionSchema,
    status: 201,
  },
  getSection: {
    method: 'GET',
    path: section,
    summary: 'One section',
    permission: 'released.read',
    params: sectionParams,
    reply: sectionSchema,
  },
  changeSection: {
    method: 'PATCH',
    path: section,
    summary: 'Name, purpose, archive or take back',
    permission: 'sections.write',
    params: sectionParams,
    body: sectionChangeSchema,
    reply: sectionSchema,
  },
  archiveSection: {
    method: 'DELETE',
    path: section,
    summary: 'Archive',
    permission: 'sections.write',
    params: sectionParams,
    reply: null,
  },

  getDraft: {
    method: 'GET',
    path: `${section}/draft`,
    summary: 'Own unsaved work',
    permission: 'sections.write',
    params: sectionParams,
    reply: draftSchema,
  },
  keepDraft: {
    method: 'PUT',
    path: `${section}/draft`,
    summary: 'Keep unsaved work',
    permission: 'sections.write',
    params: sectionParams,
    body: draftInputSchema,
    reply: draftSchema,
  },
  dropDraft: {
    method: 'DELETE',
    path: `${section}/draft`,
    summary: 'Discard unsaved work',
    permission: 'sections.write',
    params: sectionParams,
    reply: null,
  },

  listVersions: {
    method: 'GET',
    path: `${section}/versions`,
    summary: 'Versions, newest first',
    permission: 'released.read',
    params: sectionParams,
    query: pageQuerySchema,
    reply: versionPageSchema,
  },
  saveVersion: {
    method: 'POST',
    path: `${section}/versions`,
    summary: 'Save as the next version; 409 when another came in between',
    permission: 'sections.write',
    params: sectionParams,
    body: versionCreateSchema,
    reply: versionSchema,
    status: 201,
  },
  getVersion: {
    method: 'GET',
    path: version,
    summary: 'One immutable version',
    permission: 'released.read',
    params: versionParams,
    reply: versionSchema,
  },
  releaseVersion: {
    method: 'POST',
    path: `${version}/release`,
    summary: 'Release; the one released before is superseded',
    permission: 'versions.release',
    params: versionParams,
    body: releaseSchema,
    reply: versionSchema,
  },
  withdrawVersion: {
    method: 'POST',
    path: `${version}/withdraw`,
    summary: 'Withdraw a released version',
    permission: 'versions.release',
    params: versionParams,
    body: withdrawSchema,
    reply: versionSchema,
  },
  listDownloads: {
    method: 'GET',
    path: `${version}/downloads`,
    summary: 'Who took which file',
    permission: 'downloads.read',
    params: versionParams,
    query: pageQuerySchema,
    reply: downloadPageSchema,
  },

  datFile: {
    method: 'GET',
    path: `${version}/contour.dat`,
    summary: 'Coordinates',
    permission: 'files.download',
    params: versionParams,
    query: datOptionsSchema,
    reply: z.string(),
    file: 'text/plain',
  },
  dxfFile: {
    method: 'GET',
    path: `${version}/contour.dxf`,
    summary: 'Drawing exchange file in mm',
    permission: 'files.download',
    params: versionParams,
    query: dxfOptionsSchema,
    reply: z.string(),
    file: 'image/vnd.dxf',
  },
  svgFile: {
    method: 'GET',
    path: `${version}/contour.svg`,
    summary: 'Drawing at true size',
    permission: 'files.download',
    params: versionParams,
    query: svgOptionsSchema,
    reply: z.string(),
    file: 'image/svg+xml',
  },

  ...shopEndpoints,
} as const satisfies Record<string, Endpoint>;
export type EndpointName = keyof typeof endpoints;
