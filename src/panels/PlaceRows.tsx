import { useMemo, useRef } from 'react';
import { QuantityField } from '../controls/QuantityField';
import { type Aimed, aimMeets, aimsThrough, alongAim, turnTo } from '../layout/aim';
import { facesOf } from '../layout/geometry';
import type { Vec3 } from '../layout/schema';
import { useLayout, useSession } from '../session/session';
import { bind, changePlaced, type DeviceRef, type Placed } from './binding';
import { LengthField, Row } from './Fields';

export const AXES = ['x', 'y', 'z'] as const;
/** Range of a coordinate in the layout, metres. */
export const MOST_M = 10000;

/** Where a thing stands. */
export function PlaceRow({ device, item }: { device: Placed; item: DeviceRef }) {
  const schemeId = useSession((session) => session.schemeId);
  return (
    <Row what="Place" at={['position']}>
      {AXES.map((axis, i) => (
        <LengthField
          key={axis}
          label={`Place ${axis}`}
          name={axis}
          value={device.position[i]}
          min={-MOST_M}
          max={MOST_M}
          {...bind<number | null>(`Move ${item.id}`, `${item.kind}.${item.id}.position.${axis}`, (layout, value) =>
            changePlaced(layout, schemeId, item, (draft) => {
              if (value !== null) draft.position[i] = value;
            }),
          )}
        />
      ))}
    </Row>
  );
}

/** How a thing is turned. Talkers do not roll. */
export function TurnRow({ device, item }: { device: Placed; item: DeviceRef }) {
  const schemeId = useSession((session) => session.schemeId);
  const angles = item.kind === 'talker' ? (['pan', 'tilt'] as const) : (['pan', 'tilt', 'roll'] as const);
  return (
    <Row what="Turn" at={[...angles]}>
      {angles.map((angle) => (
        <QuantityField
          key={angle}
          label={`Turn ${angle}`}
          name={angle}
          value={angle === 'roll' ? ('roll' in device ? device.roll : 0) : device[angle]}
          unit="°"
          min={-360}
          max={360}
          {...bind<number | null>(`Turn ${item.id}`, `${item.kind}.${item.id}.${angle}`, (layout, value) =>
            changePlaced(layout, schemeId, item, (draft) => {
              if (value === null) return;
              if (angle !== 'roll') draft[angle] = value;
              else if ('roll' in draft) draft.roll = value;
            }),
          )}
        />
      ))}
    </Row>
  );
}

/** How far along the aim its point is taken where it meets no face, metres. */
const OPEN_AIM_M = 3;

/** The aim's point on the surface it meets; typing one turns the device to it. */
export function AimRow({ device, item }: { device: Aimed; item: DeviceRef }) {
  const schemeId = useSession((session) => session.schemeId);
  const met = useAim(device);
  // A point that was typed stays as long as the aim goes through it, although the aim may meet a surface beyond: one
  // coordinate after the other can be typed.
  const typed = useRef<Vec3 | null>(null);
  const meant = typed.current !== null && aimsThrough(device, typed.current) ? typed.current : null;
  const point = meant ?? met?.point ?? alongAim(device, OPEN_AIM_M);
  return (
    <Row what="Aims at">
      {AXES.map((axis, i) => {
        const { onChange, onCancel } = bind<Vec3>(
          `Aim ${item.id}`,
          `${item.kind}.${item.id}.aim.${axis}`,
          (layout, target) =>
            changePlaced(layout, schemeId, item, (draft) => {
              Object.assign(draft, turnTo({ ...draft, position: [...draft.position] as Vec3 }, target));
            }),
        );
        return (
          <LengthField
            key={axis}
            label={`Aims at ${axis}`}
            name={axis}
            value={point[i]}
            min={-MOST_M}
            max={MOST_M}
            onChange={(value, phase) => {
              if (value === null) return;
              // Settling what is there already turns nothing, not even by a rounding.
              if (phase === 'commit' && value === point[i]) return useSession.getState().endEdit();
              const target: Vec3 = [...point];
              target[i] = value;
              typed.current = target;
              onChange(target, phase);
            }}
            onCancel={onCancel}
          />
        );
      })}
    </Row>
  );
}

/** Where a device's aim meets a face of the venue, with the face's id. */
export function useAim(device: Aimed & { host?: string | null }) {
  const { venue } = useLayout();
  const { faces: faceList, finishes } = venue;
  const faces = useMemo(() => facesOf({ faces: faceList, finishes }), [faceList, finishes]);
  const host = device.host == null ? -1 : faceList.findIndex((face) => face.id === device.host);
  const met = aimMeets(faces, device, host);
  return met === null ? null : { ...met, faceId: faceList[met.face].id };
}
