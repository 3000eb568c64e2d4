import { type TestApp } from './app.ts';

/** The id of a section of the demo workshop, or of one made by a story. */
export async function sectionIdOf({ database }: TestApp, name: string): Promise<string> {
  const row: { id: string } | undefined = await database.knex('sections').where({ name }).first('id');
  if (!row) throw new Error(`There is no section “${name}”.`);
  return row.id;
}

export async function sectionPath(app: TestApp, name: string, version?: number): Promise<string> {
  const path = `/sections/${await sectionIdOf(app, name)}`;
  return version === undefined ? path : `${path}/versions/${String(version)}`;
}

export async function sheetIdOf({ database }: TestApp, name: string): Promise<string> {
  const row: { id: string } | undefined = await database.knex('cut_sheets').where({ name }).first('id');
  if (!row) throw new Error(`There is no cut sheet “${name}”.`);
  return row.id;
}

export async function sheetPath(app: TestApp, name: string, version?: number): Promise<string> {
  const path = `/cut-sheets/${await sheetIdOf(app, name)}`;
  return version === undefined ? path : `${path}/versions/${String(version)}`;
}
