import { addAfterEffect, useFrame, useThree } from '@react-three/fiber';
import { useEffect, useRef } from 'react';
import { Matrix4, Vector2, Vector3, type PerspectiveCamera } from 'three';

import { createProjection } from '../model/projection.ts';
import { viewPose, type ViewPose } from '../model/scene-view.ts';
import type { Vector } from '../model/vector.ts';
import type { SceneInks } from '../raster/cpu-renderer.ts';
import type { StageFrames } from '../stage/frames.ts';
import type { ViewStore } from '../stage/view-store.ts';
import type { SceneUniforms } from './materials.ts';

export interface ViewRigProps {
  store: ViewStore;
  frames: StageFrames;
  bounds: { readonly centreA: Vector; readonly radiusA: number };
  inks: Omit<SceneInks, 'nearA' | 'farA'>;
  uniforms: SceneUniforms;
  onFrameDrawn: () => void;
}

const scratch = { x: new Vector3(), y: new Vector3(), z: new Vector3(), size: new Vector2() };
const basis = new Matrix4();

function place(camera: PerspectiveCamera, pose: ViewPose, aspect: number): void {
  basis.makeBasis(
    scratch.x.set(...pose.right),
    scratch.y.set(...pose.up),
    scratch.z.set(...pose.toward),
  );
  camera.position.set(...pose.eye);
  camera.quaternion.setFromRotationMatrix(basis);
  camera.fov = pose.openingDeg;
  camera.aspect = aspect;
  camera.near = Math.max(pose.nearA * 0.5, 0.05);
  camera.far = pose.farA * 1.5;
  camera.updateProjectionMatrix();
  camera.updateMatrixWorld();
}

/** Puts the camera where the view says, before each frame, and tells the overlay. */
export function ViewRig(props: ViewRigProps): null {
  const { store, frames, bounds, inks, uniforms, onFrameDrawn } = props;
  const invalidate = useThree((state) => state.invalidate);
  const isPending = useRef(false);

  useEffect(() => store.subscribe(() => invalidate()), [store, invalidate]);
  useEffect(() => invalidate(), [invalidate, bounds, inks]);
  useEffect(
    () =>
      addAfterEffect(() => {
        if (isPending.current) {
          isPending.current = false;
          onFrameDrawn();
        }
      }),
    [onFrameDrawn],
  );

  useFrame(({ camera, size, gl, scene }) => {
    const aspect = size.width / Math.max(size.height, 1);
    const pose = viewPose(store.view, bounds, aspect);
    place(camera as PerspectiveCamera, pose, aspect);
    scene.userData.inks = { ...inks, nearA: pose.nearA, farA: pose.farA } satisfies SceneInks;
    const buffer = gl.getDrawingBufferSize(scratch.size);
    uniforms.uNear.value = pose.nearA;
    uniforms.uFar.value = pose.farA;
    uniforms.uResolution.value.copy(buffer);
    uniforms.uPixelRatio.value = gl.getPixelRatio();
    uniforms.uFocal.value = buffer.y / 2 / Math.tan((pose.openingDeg * Math.PI) / 360);
    frames.publish(createProjection(pose, size.width, size.height));
    isPending.current = true;
  });
  return null;
}
