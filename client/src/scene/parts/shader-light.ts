import { farFade, glossDirection, keyLight, light } from '../model/light.ts';

const number = (value: number): string => value.toFixed(6);
const vector = (parts: readonly number[]): string => `vec3(${parts.map(number).join(', ')})`;

/** The light of model/light.ts in GLSL; colours are display values throughout, as on the canvas. */
export const lightChunk = /* glsl */ `
uniform vec3 uPaper;
uniform float uNear;
uniform float uFar;

vec2 shade(vec3 n) {
  float lambert = (dot(n, ${vector(keyLight)}) + ${number(light.wrap)}) / ${number(1 + light.wrap)};
  float key = max(0.0, lambert);
  float halfway = max(0.0, dot(n, ${vector(glossDirection)}));
  float rim = pow(1.0 - max(0.0, n.z), 3.0);
  float body = ${number(light.ambient)} + ${number(light.key)} * key + ${number(light.sky)} * n.y
    - ${number(light.rim)} * rim;
  float gloss = ${number(light.gloss)} * pow(halfway, ${number(light.glossPower)})
    + ${number(light.sheen)} * pow(halfway, ${number(light.sheenPower)}) * key;
  return vec2(body, gloss);
}

float fadeAt(float depth) {
  float share = clamp((depth - uNear) / (uFar - uNear), 0.0, 1.0);
  return ${number(farFade)} * share * (0.5 + 0.5 * share);
}

vec3 lit(vec3 colour, vec2 tone, float fade) {
  return mix(min(colour * tone.x + tone.y, 1.0), uPaper, fade);
}
`;
