import { Action } from '../controls/Action';
import { Choice } from '../controls/Choice';
import { FindChoice } from '../controls/FindChoice';
import { layOn, nearestFace } from '../layout/aim';
import { findModel, modelsOfKind } from '../layout/catalogue';
import { facesOf } from '../layout/geometry';
import type { DeviceKind, Layout, Loudspeaker, Microphone } from '../layout/schema';
import { useLayout, useSession } from '../session/session';
import { changePlaced, type DeviceRef, editOnce } from './binding';
import { Row } from './Fields';

/** The model of a device, from the layout's own and the catalogue's. */
export function ModelField({ item, model, wide = false }: { item: DeviceRef; model: string; wide?: boolean }) {
  const layout = useLayout();
  const schemeId = useSession((session) => session.schemeId);
  const kind: DeviceKind = item.kind;
  const own = new Set(layout.models.map((candidate) => candidate.id));
  const options = modelsOfKind(layout, kind).map((candidate) => ({
    id: candidate.id,
    label: candidate.label || candidate.id,
    ...(own.has(candidate.id) && { detail: 'this layout' }),
  }));
  const adopt = (id: string) => {
    const label = options.find((option) => option.id === id)?.label ?? id;
    editOnce(`Change ${item.id} to ${label}`, (before) =>
      changePlaced(before, schemeId, item, (draft) => {
        draft.model = id;
      }),
    );
  };
  return (
    <FindChoice className={wide ? 'full' : 'wide'} label="Model" value={model} options={options} onChange={adopt} />
  );
}

/** Model and the face a device lies on; a model made to lie on a face offers the nearest one. */
export function ModelRows({ item, device }: { item: DeviceRef; device: Microphone | Loudspeaker }) {
  const layout = useLayout();
  const schemeId = useSession((session) => session.schemeId);
  const faceIds = layout.venue.faces.map((face) => face.id);
  const options = [{ id: '', label: 'no face' }, ...faceIds.map((id) => ({ id, label: id }))];
  const lay = (faceId: string) =>
    editOnce(`Lay ${item.id} on ${faceId}`, (before) => laid(before, schemeId, item, faceId));
  const setHost = (faceId: string) => {
    if (faceId !== '') return lay(faceId);
    editOnce(`Take ${item.id} off ${device.host}`, (before) =>
      changePlaced(before, schemeId, item, (draft) => {
        if ('host' in draft) draft.host = null;
      }),
    );
  };
  const pattern = findModel(layout, device.model, item.kind)?.pattern.type;
  const lies = pattern === 'boundary' || pattern === 'flush-piston';
  const nearest = lies && device.host === null ? nearestFace(facesOf(layout.venue), device.position) : -1;
  return (
    <>
      <Row what="Model" at={['model', 'host']}>
        <ModelField item={item} model={device.model} />
        <Choice
          className={(device.host ?? '').length > 8 ? 'host full' : 'host'}
          label="On face"
          name="on"
          value={device.host ?? ''}
          options={options}
          onChange={setHost}
        />
      </Row>
      {nearest >= 0 && (
        <p className="item-offer">
          This model is made to lie on a face.{' '}
          <Action look="use" onPress={() => lay(faceIds[nearest])}>
            Lay on {faceIds[nearest]}
          </Action>
        </p>
      )}
    </>
  );
}

/** The layout with a device on a face: hosted there, on its plane, aimed along its inward normal. */
export function laid(layout: Layout, schemeId: string, ref: DeviceRef, faceId: string): Layout {
  const face = layout.venue.faces.findIndex((candidate) => candidate.id === faceId);
  if (face < 0) return layout;
  const faces = facesOf(layout.venue);
  return changePlaced(layout, schemeId, ref, (draft) => {
    if (!('host' in draft)) return;
    const [x, y, z] = draft.position;
    Object.assign(draft, layOn(faces, face, { pan: draft.pan, tilt: draft.tilt, position: [x, y, z] }));
    draft.host = faceId;
  });
}
