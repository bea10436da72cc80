import { OrbitControls } from '@react-three/drei';
import { useFrame, useThree } from '@react-three/fiber';
import {
  type ComponentRef,
  type RefObject,
  useCallback,
  useEffect,
  useImperativeHandle,
  useLayoutEffect,
  useRef,
  useState,
} from 'react';
import { MOUSE, OrthographicCamera, PerspectiveCamera, Vector3 } from 'three';
import type { Vec3 } from '../layout/schema';
import { FOV_DEG, orbited, type Shot } from './views';

/** What the keys and the selection may ask of the camera. */
export interface CameraHandle {
  show(shot: Shot): void;
  orbit(azimuthRad: number, elevationRad: number): void;
  /** Nearer for more than 1. */
  zoom(by: number): void;
  /** Shares of the height of the picture. */
  pan(right: number, up: number): void;
  /** Moves along, without turning, where a point is out of the picture. */
  bringIn(point: Vec3): void;
}

interface CameraRigProps {
  handle: RefObject<CameraHandle | null>;
  /** Pixels on the right that the picture keeps clear. */
  rightPx: number;
  /** Where to stand at first, and again when the picture changes its size before anyone moved the camera. */
  home: Shot | null;
  software: boolean;
  moving: RefObject<boolean>;
}

/** Pixels a device pixel shows while the view moves on software: pixels are what costs. */
const MOVING_DPR = 0.6;
const STILL_MS = 160;
const FLIGHT_MS = 420;
/** A camera nearer than this to what it turns about stands in the room and looks round, metres. */
const STANDING_M = 0.3;

interface Flight {
  from: { eye: Vector3; target: Vector3; fov: number };
  to: { eye: Vector3; target: Vector3; fov: number };
  startedMs: number;
}

/** Two cameras, one in perspective and one parallel, the controls of the one in use, and the way between views. */
export default function CameraRig({ handle, rightPx, home, software, moving }: CameraRigProps) {
  const set = useThree((three) => three.set);
  const size = useThree((three) => three.size);
  const canvas = useThree((three) => three.gl.domElement);
  const invalidate = useThree((three) => three.invalidate);
  const [cameras] = useState(createCameras);
  const [projection, setProjection] = useState<Shot['projection']>('perspective');
  const controls = useRef<ComponentRef<typeof OrbitControls>>(null);
  const pending = useRef<Shot | null>(null);
  const flight = useRef<Flight | null>(null);
  const touched = useRef(false);
  const { start, stop } = useMoving(software, moving);
  const camera = cameras[projection];

  useLayoutEffect(() => set({ camera }), [set, camera]);
  useLayoutEffect(() => {
    frameCameras(cameras, size.width, size.height, rightPx);
    invalidate();
  }, [cameras, size, rightPx, invalidate]);

  const stand = useCallback(
    (shot: Shot, fly: boolean) => {
      const control = controls.current;
      if (control === null) return;
      const { perspective, parallel } = cameras;
      control.rotateSpeed = shot.fovDeg > 55 ? -0.35 : 1;
      const [eye, target] = [new Vector3(...shot.eye), new Vector3(...shot.target)];
      flight.current = null;
      if (shot.projection === 'parallel') {
        parallel.position.copy(eye);
        parallel.zoom = 1 / shot.metresPerPixel;
        parallel.updateProjectionMatrix();
        control.target.copy(target);
        control.update();
      } else if (fly && !matchMedia('(prefers-reduced-motion: reduce)').matches) {
        const from = { eye: perspective.position.clone(), target: control.target.clone(), fov: perspective.fov };
        flight.current = { from, to: { eye, target, fov: shot.fovDeg }, startedMs: performance.now() };
        start();
      } else {
        perspective.position.copy(eye);
        perspective.fov = shot.fovDeg;
        perspective.updateProjectionMatrix();
        control.target.copy(target);
        control.update();
      }
      invalidate();
    },
    [cameras, invalidate, start],
  );

  // The controls of the other camera exist only after React has made them.
  useEffect(() => {
    if (pending.current === null || pending.current.projection !== projection) return;
    stand(pending.current, false);
    pending.current = null;
  }, [projection, stand]);

  useEffect(() => {
    if (home !== null && !touched.current && projection === 'perspective') stand(home, false);
  }, [home, projection, stand]);

  useFrame(() => {
    const now = flight.current;
    const control = controls.current;
    if (now === null || control === null) return;
    const share = Math.min(1, (performance.now() - now.startedMs) / FLIGHT_MS);
    const eased = share * share * (3 - 2 * share);
    const { perspective } = cameras;
    perspective.position.lerpVectors(now.from.eye, now.to.eye, eased);
    control.target.lerpVectors(now.from.target, now.to.target, eased);
    perspective.fov = now.from.fov + (now.to.fov - now.from.fov) * eased;
    perspective.updateProjectionMatrix();
    if (share < 1) invalidate();
    else {
      flight.current = null;
      stop();
    }
  }, -2);

  useImperativeHandle(handle, (): CameraHandle => {
    const nudge = (change: (control: NonNullable<typeof controls.current>) => void) => {
      if (controls.current === null) return;
      flight.current = null;
      touched.current = true;
      start();
      change(controls.current);
      camera.updateProjectionMatrix();
      controls.current.update();
      invalidate();
      stop();
    };
    const slide = (control: NonNullable<typeof controls.current>, by: Vector3) => {
      camera.position.add(by);
      control.target.add(by);
    };
    return {
      show(shot) {
        touched.current = shot !== home;
        if (shot.projection === projection) stand(shot, true);
        else {
          pending.current = shot;
          setProjection(shot.projection);
        }
      },
      orbit: (azimuthRad, elevationRad) =>
        nudge((control) => {
          if (projection === 'parallel') return;
          const turned = orbited(toVec3(camera.position), toVec3(control.target), azimuthRad, elevationRad);
          camera.position.set(...turned);
        }),
      zoom: (by) =>
        nudge((control) => {
          if (projection === 'parallel') camera.zoom *= by;
          else camera.position.sub(control.target).divideScalar(by).add(control.target);
        }),
      pan: (right, up) =>
        nudge((control) => {
          const heightM =
            camera instanceof PerspectiveCamera
              ? 2 * camera.position.distanceTo(control.target) * Math.tan((camera.fov * Math.PI) / 360)
              : size.height / camera.zoom;
          const [across, upwards] = [new Vector3(), new Vector3()];
          camera.matrixWorld.extractBasis(across, upwards, new Vector3());
          slide(control, across.multiplyScalar(right * heightM).addScaledVector(upwards, up * heightM));
        }),
      bringIn(point) {
        const control = controls.current;
        if (control === null || inPicture(point, camera)) return;
        const awayM = camera.position.distanceTo(control.target);
        if (awayM < STANDING_M) {
          // Whoever stands somewhere turns the head.
          const ahead = new Vector3(...point).sub(camera.position).setLength(awayM).add(camera.position);
          nudge(() => control.target.copy(ahead));
          return;
        }
        const by = new Vector3(...point).sub(control.target);
        const eye = camera.position.clone().add(by);
        touched.current = true;
        if (camera instanceof PerspectiveCamera) {
          const shot = { projection, eye: toVec3(eye), target: point, fovDeg: camera.fov, metresPerPixel: 0 };
          stand(shot, true);
        } else nudge(() => slide(control, by));
      },
    };
  }, [camera, projection, size, home, stand, start, stop, invalidate]);

  return (
    <OrbitControls
      ref={controls}
      camera={camera}
      domElement={canvas}
      enableDamping={false}
      enableRotate={projection === 'perspective'}
      mouseButtons={{
        LEFT: projection === 'perspective' ? MOUSE.ROTATE : MOUSE.PAN,
        MIDDLE: MOUSE.DOLLY,
        RIGHT: MOUSE.PAN,
      }}
      minDistance={0.05}
      onStart={() => {
        touched.current = true;
        flight.current = null;
        start();
      }}
      onEnd={stop}
    />
  );
}

function createCameras() {
  const perspective = new PerspectiveCamera(FOV_DEG, 1, 0.05, 2000);
  const parallel = new OrthographicCamera(-1, 1, 1, -1, 0.05, 4000);
  for (const camera of [perspective, parallel]) {
    camera.up.set(0, 0, 1);
    camera.position.set(20, 20, 20);
    // Their frames are set here and not by the canvas, because the picture is moved aside.
    Object.assign(camera, { manual: true });
  }
  return { perspective, parallel };
}

function frameCameras(
  { perspective, parallel }: ReturnType<typeof createCameras>,
  widthPx: number,
  heightPx: number,
  rightPx: number,
): void {
  perspective.aspect = widthPx / Math.max(1, heightPx);
  Object.assign(parallel, { left: -widthPx / 2, right: widthPx / 2, top: heightPx / 2, bottom: -heightPx / 2 });
  for (const camera of [perspective, parallel]) {
    camera.setViewOffset(widthPx, heightPx, rightPx / 2, 0, widthPx, heightPx);
    camera.updateProjectionMatrix();
  }
}

/** Fewer pixels while the view moves on software, all of them as soon as it is still. */
function useMoving(software: boolean, moving: RefObject<boolean>) {
  const setDpr = useThree((three) => three.setDpr);
  const timer = useRef(0);
  const start = useCallback(() => {
    window.clearTimeout(timer.current);
    moving.current = true;
    if (software) setDpr(MOVING_DPR);
  }, [software, setDpr, moving]);
  const stop = useCallback(() => {
    window.clearTimeout(timer.current);
    timer.current = window.setTimeout(() => {
      moving.current = false;
      if (software) setDpr(1);
    }, STILL_MS);
  }, [software, setDpr, moving]);
  useEffect(() => () => window.clearTimeout(timer.current), []);
  return { start, stop };
}

function inPicture(point: Vec3, camera: PerspectiveCamera | OrthographicCamera): boolean {
  camera.updateMatrixWorld();
  const seen = new Vector3(...point).project(camera);
  return Math.abs(seen.x) < 0.96 && Math.abs(seen.y) < 0.94 && seen.z < 1;
}

const toVec3 = ({ x, y, z }: Vector3): Vec3 => [x, y, z];
