import { type Knex } from 'knex';
import * as workshopsAndPeople from './0001_workshops_and_people.ts';
import * as sectionsAndVersions from './0002_sections_and_versions.ts';
import * as immutableVersions from './0003_immutable_versions.ts';
import * as downloads from './0004_downloads.ts';
import * as sessionEpoch from './0005_session_epoch.ts';
import * as machinesAndMaterials from './0006_machines_and_materials.ts';
import * as cutSheets from './0007_cut_sheets.ts';
import * as cuttingList from './0008_cutting_list.ts';
import * as flightConditions from './0009_flight_conditions.ts';

/** Every migration under the name it is remembered by; a name that has been released never changes. */
export const migrations: Readonly<Record<string, Knex.Migration>> = {
  '0001_workshops_and_people': workshopsAndPeople,
  '0002_sections_and_versions': sectionsAndVersions,
  '0003_immutable_versions': immutableVersions,
  '0004_downloads': downloads,
  '0005_session_epoch': sessionEpoch,
  '0006_machines_and_materials': machinesAndMaterials,
  '0007_cut_sheets': cutSheets,
  '0008_cutting_list': cuttingList,
  '0009_flight_conditions': flightConditions,
};
