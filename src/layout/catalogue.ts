import * as v from 'valibot';
import deviceData from '../../data/catalogue/devices.json';
import finishData from '../../data/catalogue/finishes.json';
import {
  type DeviceKind,
  type DeviceModel,
  type Finish,
  finishListSchema,
  type Layout,
  modelListSchema,
} from './schema';

/** Generic device families every layout can name: physical shapes, not products. */
export const CATALOGUE_MODELS: readonly DeviceModel[] = v.parse(modelListSchema, deviceData);

/** Published finishes a layout can take a copy of; each states its source and its 8 kHz rule. */
export const CATALOGUE_FINISHES: readonly Finish[] = v.parse(finishListSchema, finishData);

/** The model a device names: the layout's own first, then the catalogue's; undefined where neither knows it. */
export function findModel(layout: Layout, id: string, kind: DeviceKind): DeviceModel | undefined {
  return modelsOfKind(layout, kind).find((model) => model.id === id);
}

/** All models a device of this kind may name, the layout's own before the catalogue's. */
export function modelsOfKind(layout: Layout, kind: DeviceKind): DeviceModel[] {
  const own = layout.models.filter((model) => model.kind === kind);
  const shadowed = new Set(layout.models.map((model) => model.id));
  return [...own, ...CATALOGUE_MODELS.filter((model) => model.kind === kind && !shadowed.has(model.id))];
}
