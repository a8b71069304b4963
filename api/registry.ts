import { postBatch } from "./operations/batch";
import { readFieldEvents, readFieldLine, readFieldMap, readFieldPlot } from "./operations/field-pictures";
import { deleteField, postField, readField } from "./operations/fields";
import { deleteKey, listKeys, postKey, postRotation, readKey } from "./operations/keys";
import { deleteMaterial, patchMaterial, postMaterial } from "./operations/material-changes";
import { listMaterials, readMaterial } from "./operations/materials";
import { readHealth } from "./operations/health";
import { postNetwork } from "./operations/networks";
import { readOpenApi } from "./operations/openapi";
import { postOutline, readOutline } from "./operations/outlines";
import { deleteRecord, listRecords, patchRecord, readRecord, replayRecord } from "./operations/records";
import { postResistance } from "./operations/resistance";
import { getResistance } from "./operations/resistance-query";
import { postSizing } from "./operations/sizing";
import { listShapes, readShape } from "./operations/shapes";
import { readUsage } from "./operations/usage";
import { RouteTable } from "./route-table";

/** Every operation of version 1: what the servers, the document, the reference and the clients are made from. */
export const registry = new RouteTable([
  listShapes,
  readShape,
  postResistance,
  getResistance,
  postSizing,
  postBatch,
  postNetwork,
  postOutline,
  readOutline,
  postField,
  readField,
  deleteField,
  readFieldMap,
  readFieldPlot,
  readFieldLine,
  readFieldEvents,
  listMaterials,
  postMaterial,
  readMaterial,
  patchMaterial,
  deleteMaterial,
  listRecords,
  readRecord,
  patchRecord,
  deleteRecord,
  replayRecord,
  listKeys,
  postKey,
  readKey,
  postRotation,
  deleteKey,
  readUsage,
  readOpenApi,
  readHealth,
]);
