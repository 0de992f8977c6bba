import * as audit from './audit';
import * as bench from './bench';
import * as budgets from './budgets';
import * as calibrations from './calibrations';
import * as conditions from './conditions';
import * as certificates from './certificates';
import * as counts from './counts';
import * as decision from './decision';
import * as description from './description';
import { type Endpoint } from './endpoint';
import * as gaugeStudies from './gauge-studies';
import * as instruments from './instruments';
import * as lots from './lots';
import * as mail from './mail';
import * as nonconformances from './nonconformances';
import * as parts from './parts';
import * as people from './people';
import * as plans from './plans';
import * as racks from './racks';
import * as session from './session';
import * as site from './site';
import * as suppliers from './suppliers';
import * as yields from './yields';

const areas = {
  session,
  site,
  people,
  counts,
  suppliers,
  parts,
  plans,
  instruments,
  conditions,
  calibrations,
  gaugeStudies,
  lots,
  bench,
  budgets,
  racks,
  decision,
  certificates,
  nonconformances,
  mail,
  audit,
  yields,
  description,
};

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === 'object' && value !== null && 'method' in value && 'path' in value && 'who' in value;
}

/** Every endpoint there is, under its name; the description and the permission test walk this table. */
export const ENDPOINTS: ReadonlyMap<string, Endpoint & { readonly area: string }> = new Map(
  Object.entries(areas).flatMap(([area, exported]) =>
    Object.entries(exported).flatMap(([name, value]) =>
      isEndpoint(value) ? [[name, { ...value, area }] as const] : [],
    ),
  ),
);
