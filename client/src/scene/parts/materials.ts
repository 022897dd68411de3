import {
  Color,
  CustomBlending,
  OneFactor,
  ShaderMaterial,
  Vector2,
  ZeroFactor,
  type IUniform,
} from 'three';

import { strutTaper } from '../model/drawing.ts';
import { ground } from '../model/light.ts';
import { lightChunk } from './shader-light.ts';

/** Values all materials of a scene share, so that setting them once reaches every part. */
export interface SceneUniforms {
  readonly [name: string]: IUniform;
  readonly uPaper: IUniform<Color>;
  readonly uFoot: IUniform<Color>;
  readonly uNear: IUniform<number>;
  readonly uFar: IUniform<number>;
  readonly uResolution: IUniform<Vector2>;
  readonly uFocal: IUniform<number>;
  readonly uPixelRatio: IUniform<number>;
}

export function createUniforms(): SceneUniforms {
  return {
    uPaper: { value: new Color() },
    uFoot: { value: new Color() },
    uNear: { value: 0 },
    uFar: { value: 1 },
    uResolution: { value: new Vector2(1, 1) },
    uFocal: { value: 1 },
    uPixelRatio: { value: 1 },
  };
}

/** Shared by the vertex shaders: pixels of the drawing buffer from places in the viewer's frame. */
const screenChunk = /* glsl */ `
uniform vec2 uResolution;
uniform float uFocal;
uniform float uPixelRatio;

vec2 toPixels(vec3 place) {
  return uResolution * 0.5 + place.xy * uFocal / -place.z;
}
vec4 toClip(vec2 pixels, float depth) {
  vec4 clip = projectionMatrix * vec4(0.0, 0.0, -depth, 1.0);
  return vec4((pixels / uResolution * 2.0 - 1.0) * clip.w, clip.zw);
}
`;

const sphereVertex = /* glsl */ `
${screenChunk}
attribute vec3 centre;
attribute float radius;
attribute vec3 colour;
attribute float sign;
varying vec3 vColour;
varying vec2 vOffset;
varying float vRadiusPx;
varying float vRadius;
varying float vDepth;
varying float vSign;

void main() {
  vec3 place = (viewMatrix * vec4(centre, 1.0)).xyz;
  float depth = -place.z;
  vRadiusPx = uFocal * radius / sqrt(max(depth * depth - radius * radius, 1e-6));
  vRadius = radius;
  vDepth = depth;
  vColour = colour;
  vSign = sign;
  vOffset = position.xy * (vRadiusPx + 1.0);
  gl_Position = toClip(toPixels(place) + vOffset, depth);
}
`;

const sphereFragment = /* glsl */ `
${lightChunk}
uniform mat4 projectionMatrix;
varying vec3 vColour;
varying vec2 vOffset;
varying float vRadiusPx;
varying float vRadius;
varying float vDepth;
varying float vSign;

float bar(vec2 offset, vec2 halfSize) {
  vec2 inside = clamp(halfSize - abs(offset) + 0.5, 0.0, 1.0);
  return inside.x * inside.y;
}
float mark(vec2 offset) {
  float arm = vRadiusPx * 0.3;
  float thick = max(0.7, vRadiusPx * 0.075);
  float level = bar(offset, vec2(arm, thick));
  return vSign > 0.0 ? max(level, bar(offset, vec2(thick, arm))) : level;
}

void main() {
  float away = length(vOffset);
  float cover = clamp(vRadiusPx + 0.5 - away, 0.0, 1.0);
  if (cover <= 0.0) discard;
  vec2 flat2 = vOffset / vRadiusPx;
  float squared = dot(flat2, flat2);
  vec3 normal = squared > 1.0
    ? vec3(flat2 / sqrt(squared), 0.0)
    : vec3(flat2, sqrt(1.0 - squared));
  float fade = fadeAt(vDepth);
  vec3 shown = lit(vColour, shade(normal), fade);
  if (vSign != 0.0 && vRadiusPx >= 4.0) {
    float rest = 1.0 - fade * 0.7;
    float shift = max(0.8, vRadiusPx * 0.035);
    shown *= 1.0 - mark(vOffset - vec2(shift, -shift)) * 0.45 * rest;
    shown = mix(shown, vec3(0.988, 0.984, 0.969), mark(vOffset) * 0.96 * rest);
  }
  float z = -(vDepth - normal.z * vRadius);
  gl_FragDepth = (projectionMatrix[2][2] * z + projectionMatrix[3][2]) / -z * 0.5 + 0.5;
  gl_FragColor = vec4(shown, cover);
}
`;

const strutVertex = /* glsl */ `
attribute vec3 start;
attribute vec3 finish;
attribute vec3 startColour;
attribute vec3 finishColour;
uniform float uStrutRadius;
varying vec3 vNormal;
varying vec3 vStartColour;
varying vec3 vFinishColour;
varying float vAlong;
varying float vDepth;

void main() {
  vec3 one = (viewMatrix * vec4(start, 1.0)).xyz;
  vec3 other = (viewMatrix * vec4(finish, 1.0)).xyz;
  vec3 axis = normalize(other - one);
  vec3 helper = abs(axis.z) < 0.9 ? vec3(0.0, 0.0, 1.0) : vec3(1.0, 0.0, 0.0);
  vec3 side = normalize(cross(axis, helper));
  vec3 front = cross(side, axis);
  vAlong = position.z;
  float middle = 2.0 * vAlong - 1.0;
  float profile = 1.0 - ${strutTaper.toFixed(3)} * (1.0 - middle * middle);
  vNormal = side * position.x + front * position.y;
  vec3 place = mix(one, other, vAlong) + vNormal * uStrutRadius * profile;
  vDepth = -mix(one, other, vAlong).z;
  vStartColour = startColour;
  vFinishColour = finishColour;
  gl_Position = projectionMatrix * vec4(place, 1.0);
}
`;

const strutFragment = /* glsl */ `
${lightChunk}
varying vec3 vNormal;
varying vec3 vStartColour;
varying vec3 vFinishColour;
varying float vAlong;
varying float vDepth;

void main() {
  vec2 tone = shade(normalize(vNormal));
  float fromEnd = min(vAlong, 1.0 - vAlong);
  tone.x *= fromEnd < 0.2 ? 0.8 + fromEnd : 1.0;
  vec3 colour = mix(vStartColour, vFinishColour, smoothstep(0.34, 0.66, vAlong));
  gl_FragColor = vec4(lit(colour, tone, fadeAt(vDepth)), 1.0);
}
`;

const ribbonVertex = /* glsl */ `
${screenChunk}
attribute vec3 start;
attribute vec3 finish;
uniform float uWidth;
uniform float uBias;
varying vec2 vPlace;
varying float vLength;
varying float vDepth;

void main() {
  vec3 one = (viewMatrix * vec4(start, 1.0)).xyz;
  vec3 other = (viewMatrix * vec4(finish, 1.0)).xyz;
  vec2 from = toPixels(one);
  vec2 to = toPixels(other);
  vLength = length(to - from);
  vec2 along = (to - from) / max(vLength, 1e-4);
  float reach = uWidth * uPixelRatio * 0.5 + 1.0;
  float share = position.x;
  vPlace = vec2(share * vLength, position.y * reach);
  vec2 pixels = mix(from, to, share) + vec2(-along.y, along.x) * vPlace.y;
  vDepth = -mix(one, other, share).z;
  gl_Position = toClip(pixels, max(vDepth - uBias, 1e-3));
}
`;

const ribbonFragment = /* glsl */ `
${lightChunk}
uniform float uPixelRatio;
uniform float uWidth;
uniform vec3 uColour;
uniform float uOpacity;
uniform float uSpacing;
varying vec2 vPlace;
varying float vLength;
varying float vDepth;

void main() {
  float halfWidth = uWidth * uPixelRatio * 0.5;
  float away = abs(vPlace.y);
  if (uSpacing > 0.0) {
    float spacing = uSpacing * uPixelRatio;
    away = length(vec2(vPlace.x - floor(vPlace.x / spacing + 0.5) * spacing, vPlace.y));
  }
  float cover = clamp(halfWidth + 0.5 - away, 0.0, 1.0);
  if (cover <= 0.0) discard;
  gl_FragColor = vec4(uColour, cover * uOpacity * (1.0 - fadeAt(vDepth)));
}
`;

const groundVertex = /* glsl */ `
varying vec2 vPlace;
void main() {
  vPlace = vec2(position.x, -position.y) * 0.5 + 0.5;
  gl_Position = vec4(position.xy, 1.0, 1.0);
}
`;

const groundFragment = /* glsl */ `
uniform vec3 uPaper;
uniform vec3 uFoot;
varying vec2 vPlace;
void main() {
  vec2 away = (vPlace - vec2(0.5, ${ground.middle})) / vec2(${ground.width}, ${ground.height});
  float near = max(0.0, 1.0 - dot(away, away));
  gl_FragColor = vec4(mix(uPaper, uFoot, near * near), 1.0);
}
`;

/** Balls as discs that face the viewer, shaded and given depth as the balls they stand for. */
export function createSphereMaterial(uniforms: SceneUniforms): ShaderMaterial {
  return new ShaderMaterial({
    uniforms,
    vertexShader: sphereVertex,
    fragmentShader: sphereFragment,
    alphaToCoverage: true,
    // The rim's alpha is for the sample mask only; the canvas itself stays opaque.
    blending: CustomBlending,
    blendSrc: OneFactor,
    blendDst: ZeroFactor,
    blendSrcAlpha: OneFactor,
    blendDstAlpha: OneFactor,
    toneMapped: false,
  });
}

export function createStrutMaterial(uniforms: SceneUniforms, radiusA: number): ShaderMaterial {
  return new ShaderMaterial({
    uniforms: { ...uniforms, uStrutRadius: { value: radiusA } },
    vertexShader: strutVertex,
    fragmentShader: strutFragment,
    toneMapped: false,
  });
}

export interface RibbonLook {
  readonly widthPx: number;
  readonly colour: Color;
  readonly opacity: number;
  /** 0 for a full line. */
  readonly spacingPx: number;
  readonly biasA: number;
  readonly depthTest: boolean;
}

export function createRibbonMaterial(uniforms: SceneUniforms, look: RibbonLook): ShaderMaterial {
  return new ShaderMaterial({
    uniforms: {
      ...uniforms,
      uWidth: { value: look.widthPx },
      uColour: { value: look.colour },
      uOpacity: { value: look.opacity },
      uSpacing: { value: look.spacingPx },
      uBias: { value: look.biasA },
    },
    vertexShader: ribbonVertex,
    fragmentShader: ribbonFragment,
    transparent: true,
    depthTest: look.depthTest,
    depthWrite: false,
    toneMapped: false,
  });
}

export function createGroundMaterial(uniforms: SceneUniforms): ShaderMaterial {
  return new ShaderMaterial({
    uniforms,
    vertexShader: groundVertex,
    fragmentShader: groundFragment,
    depthTest: false,
    depthWrite: false,
    toneMapped: false,
  });
}
